import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ChosenStage } from '../../src/presentation/chosen-text.js';
import { junitXml } from '../../src/presentation/junit.js';
import { xmlAttribute, xmlText } from '../../src/presentation/xml-text.js';
import { SAMPLE_PARTS, sampleExplanation } from '../support/sample-report.js';
import { readXml, type Element } from '../support/strict-xml.js';

const judged = (id: string): ChosenStage => ({ file: `${id}.yaml`, part: id, explanation: sampleExplanation(id) });
const NOT: ChosenStage = { file: 'new.yaml', part: null, reason: 'not-chosen', words: 'no part is chosen for it' };
const suitesOf = (stages: readonly ChosenStage[], named = true): readonly Element[] => readXml(junitXml({ stages }, { named })).children;
const casesOf = (suite: Element | undefined): readonly Element[] => (suite?.children ?? []).filter(({ name }) => name === 'testcase');

describe('a JUnit file', () => {
  it('has one suite a stage and one case a check, and tallies that are those of its cases', () => {
    const suites = suitesOf(SAMPLE_PARTS.map(({ id }) => judged(id)));
    expect(suites.map(({ name, attributes }) => [name, attributes['name']])).toEqual(SAMPLE_PARTS.map(({ id }) => ['testsuite', `${id}.yaml`]));
    for (const [at, { id }] of SAMPLE_PARTS.entries()) {
      const { verdicts } = sampleExplanation(id).judged;
      const cases = casesOf(suites[at]);
      expect(cases.map(({ attributes }) => attributes['name'])).toEqual(verdicts.map(({ title }) => title));
      expect(cases.map(({ children }) => children[0]?.name ?? 'pass')).toEqual(verdicts.map(({ outcome }) => ({ pass: 'pass', fail: 'failure', unknown: 'error' })[outcome]));
      const number = (kind: string): string => String(cases.filter(({ children }) => children[0]?.name === kind).length);
      expect(suites[at]?.attributes).toMatchObject({ tests: String(verdicts.length), failures: number('failure'), errors: number('error'), skipped: '0' });
    }
  });

  it('tells a failure with both numbers, and an open check with where it turns', () => {
    const all = suitesOf(SAMPLE_PARTS.map(({ id }) => judged(id))).flatMap(casesOf).flatMap(({ children }) => children);
    const failures = all.filter(({ name }) => name === 'failure');
    expect(failures.length).toBeGreaterThan(3);
    for (const { attributes, text } of failures) {
      expect(attributes['type']).toBe('does-not-fit');
      expect(attributes['message']).toMatch(/\d[^,]*, .*\d.*: (?:short|over) by|, wanted /u);
      expect(text).toContain('FAIL');
    }
    expect(all.filter(({ name }) => name === 'error').map(({ text }) => text).join('\n')).toContain('Decides at:');
  });

  it('a stage without a part is an error where it was named, skipped among all saved ones', () => {
    const kind = (named: boolean): unknown => casesOf(suitesOf([NOT], named)[0])[0]?.children[0]?.name;
    expect([kind(true), kind(false)]).toEqual(['error', 'skipped']);
    expect(casesOf(suitesOf([{ file: 'a.yaml', part: 'A', reason: 'withdrawn', words: 'gone' }])[0])[0]?.children[0]?.name).toBe('failure');
    expect(casesOf(suitesOf([{ file: 'a.yaml', part: 'A', reason: 'gone', words: 'gone' }])[0])[0]?.children[0]?.name).toBe('error');
  });

  it('holds whatever a file or an id is called', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 30 }), fc.string({ unit: 'grapheme', maxLength: 30 }), (file, part) => {
      const [suite] = suitesOf([{ file, part, reason: 'unknown-part', words: `no part ${part} in <the> catalog & "list"` }]);
      expect(suite?.attributes['tests']).toBe('1');
      expect(casesOf(suite)[0]?.children[0]?.attributes['message']).toContain('in <the> catalog & "list"');
    }), { numRuns: 200 });
  });

  it('escapes markup, and what XML cannot hold', () => {
    expect(xmlText('a<b & "c" \'d\' ]]>\n\u0000\u001b\ufffe')).toBe('a&lt;b &amp; &quot;c&quot; &apos;d&apos; ]]&gt;\n\\u{0}\\u{1b}\\u{fffe}');
    expect(xmlAttribute(' a\n\t b ')).toBe('a b');
  });
});
