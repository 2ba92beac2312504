import { describe, expect, it } from 'vitest';
import { commandContext } from '../../src/cli/command-context.js';
import { renderShortlist } from '../../src/index.js';
import { sampleReport } from '../support/sample-report.js';

const STYLE = { width: 200, ascii: false, colour: false, top: 20, all: false, sources: false, gluedUnits: false };

/** The commands a shortlist offers after this command line. */
function offered(stageFile: string | null, options: Parameters<typeof commandContext>[1]): string[] {
  const text = renderShortlist(sampleReport(), STYLE, commandContext(stageFile, options));
  return text.slice(text.indexOf('Next')).replace('Next', '').trim().split('\n').map((line) => line.trim().replace(/ {4}.*$/u, ''));
}

describe('the commands an answer offers', () => {
  it('repeat nothing when nothing was asked but the stage', () => {
    expect(offered('probe.yaml', {})[0]).toBe('railfit explain TEAM-0005 probe.yaml');
  });

  it('ask the same catalog', () => {
    const commands = offered('probe.yaml', { catalog: 'demo.sqlite' });
    expect(commands.length).toBe(3);
    for (const command of commands) expect(command).toMatch(/ --catalog demo\.sqlite$/u);
  });

  it('ask about the changed stage, and leave out the command that knows only the file', () => {
    const commands = offered('probe.yaml', { temperature: '0..50 °C', set: ['limits.dcError=20 mV'], assume: ['T.offsetDrift=8uV/K'], strict: true });
    expect(commands[0]).toBe("railfit explain TEAM-0005 probe.yaml --temperature '0..50 °C' --set 'limits.dcError=20 mV' --assume T.offsetDrift=8uV/K --strict");
    expect(commands.filter((command) => command.startsWith('railfit parts'))).toEqual([]);
  });

  it('describe a stage that has no file', () => {
    expect(offered(null, { topology: 'follower', supply: '3V3', input: '0.3..2.5 V' })[0]).toBe('railfit explain TEAM-0005 --topology follower --supply 3V3 --input \'0.3..2.5 V\'');
  });
});
