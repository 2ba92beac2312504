import { describe, expect, it } from 'vitest';
import { topologyBlocks } from '../../src/cli/topology-page.js';
import { TOPOLOGY_WORDS } from '../../src/cli/topology-words.js';

const text = (word: string): string => JSON.stringify(topologyBlocks(word));

describe('help TOPOLOGY', () => {
  it.each(Object.keys(TOPOLOGY_WORDS))('%s: what it does, what its draft asks, and how to start', (topology) => {
    const page = text(topology);
    expect(page).toContain(`${topology}: `);
    expect(page).toContain(`railfit draft ${topology} -o stage.yaml`);
    expect(page).toMatch(/\["supply-low","[^"]+"\]/u);
  });

  it('lists the fields of its own and no others', () => {
    expect(text('transimpedance')).toContain('photodiode.capacitance');
    expect(text('transimpedance')).not.toContain('oscillator.frequency');
    expect(text('follower')).not.toContain('Its own fields');
  });

  it('is no page for another word', () => expect(topologyBlocks('comparator')).toBeNull());
});
