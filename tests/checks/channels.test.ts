import { expect, it } from 'vitest';
import { judgingBy } from '../support/judged.js';
import { dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('channels');
const wanted = (channels: number): ReturnType<typeof stageSpec> => stageSpec('follower', dc(1, 2), { wishes: { channels } });

it('one channel is met by a dual with one section idle, two are not met by a single', () => {
  expect(judge(wanted(1), [], { identity: { channels: 1 } }).outcome).toBe('pass');
  expect(judge(wanted(1), [], { identity: { channels: 2 } })).toMatchObject({ outcome: 'pass', offered: 2 });
  expect(judge(wanted(2), [], { identity: { channels: 1 } })).toMatchObject({ outcome: 'fail', required: 2, offered: 1 });
  expect(judge(wanted(1), [])).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'channels', kind: null }] });
});

it('generic sets are judged on channels', () => {
  expect(judge(wanted(2), [], { identity: { channels: 1, tier: 'generic' } }).outcome).toBe('fail');
});
