import type { Explanation } from '../report.js';
import type { Verdict } from '../verdicts/verdict.js';
import { failingCheck, openCheck } from './check-text.js';
import type { ChosenReport, ChosenStage, NotJudged } from './chosen-text.js';
import { finished, GLUE } from './spelling.js';
import type { Style } from './style.js';
import { comparisonText, shortfall } from './verdict-words.js';
import { REASON_WORDS } from './words.js';
import { xmlAttribute, xmlText } from './xml-text.js';

/**
 * The chosen parts as build servers read test results: a suite for each stage, a case for each check. What fails is a failure; what
 * cannot be decided, and a stage that could not be judged, is an error: it is no pass. `named`: the stages were, so that one without
 * a part is a fault; among all saved ones it is skipped. Without times, so that the same input gives
 * the same bytes. Form: the JUnit XML of Ant, as build servers take it (common practice).
 */
export function junitXml({ stages }: ChosenReport, { named }: { readonly named: boolean }): string {
  const suites = stages.map((stage) => suiteOf(stage, named));
  const all = suites.flatMap(({ cases }) => cases);
  const lines = ['<?xml version="1.0" encoding="UTF-8"?>', `<testsuites name="railfit check" ${tallyOf(all)}>`, ...suites.flatMap(suiteLines), '</testsuites>'];
  return `${lines.join('\n')}\n`;
}

interface Suite {
  readonly file: string;
  readonly part: string | null;
  readonly cases: readonly Case[];
}

interface Case {
  readonly name: string;
  readonly result: { readonly kind: 'failure' | 'error' | 'skipped'; readonly type: string; readonly message: string; readonly details: string } | null;
}

function suiteOf(stage: ChosenStage, named: boolean): Suite {
  const { file, part } = stage;
  if ('explanation' in stage) return { file, part, cases: stage.explanation.judged.verdicts.map((verdict) => caseOf(verdict, stage.explanation)) };
  return { file, part, cases: [{ name: 'stage and part', result: { kind: named && stage.reason === 'not-chosen' ? 'error' : KINDS[stage.reason], type: stage.reason, message: stage.words, details: '' } }] };
}

/** A withdrawn part is a "no"; a stage nobody chose a part for was not asked about. */
const KINDS: Readonly<Record<NotJudged, 'failure' | 'error' | 'skipped'>> = { withdrawn: 'failure', 'not-chosen': 'skipped', 'unknown-part': 'error', gone: 'error', unreadable: 'error', wrong: 'error' };

function caseOf(verdict: Verdict, explanation: Explanation): Case {
  if (verdict.outcome === 'pass') return { name: verdict.title, result: null };
  const origins = { part: explanation.judged.part, origin: explanation.origin };
  if (verdict.outcome === 'fail') return { name: verdict.title, result: { kind: 'failure', type: 'does-not-fit', message: `${comparisonText(verdict)}: ${shortfall(verdict)}`, details: finished(failingCheck(verdict, origins, PLAIN), PLAIN) } };
  const why = [comparisonText(verdict), verdict.reason === null ? '' : REASON_WORDS[verdict.reason]].filter((words) => words !== '').join(': ');
  return { name: verdict.title, result: { kind: 'error', type: 'cannot-be-decided', message: why, details: finished(openCheck(verdict, origins, PLAIN), PLAIN) } };
}

/** Text as a file takes it. */
const PLAIN: Style = { width: 100, ascii: false, colour: false, top: 20, all: false, sources: false, gluedUnits: false };

function tallyOf(cases: readonly Case[]): string {
  const count = (kind: string): number => cases.filter(({ result }) => result?.kind === kind).length;
  return `tests="${cases.length}" failures="${count('failure')}" errors="${count('error')}" skipped="${count('skipped')}"`;
}

function suiteLines({ file, part, cases }: Suite): string[] {
  const name = xmlAttribute(file);
  const properties = part === null ? [] : ['    <properties>', `      <property name="part" value="${xmlAttribute(part)}"/>`, '    </properties>'];
  return [`  <testsuite name="${name}" ${tallyOf(cases)}>`, ...properties, ...cases.flatMap((one) => caseLines(one, part === null ? name : `${name}: ${xmlAttribute(part)}`)), '  </testsuite>'];
}

function caseLines({ name, result }: Case, place: string): string[] {
  const head = `    <testcase classname="${place}" name="${xmlAttribute(name)}"`;
  if (result === null) return [`${head}/>`];
  const message = xmlAttribute(result.message.replaceAll(GLUE, ' '));
  const about = result.kind === 'skipped' ? `message="${message}"` : `type="${xmlAttribute(result.type)}" message="${message}"`;
  const body = xmlText(result.details.trimEnd());
  return [`${head}>`, body === '' ? `      <${result.kind} ${about}/>` : `      <${result.kind} ${about}>${body}</${result.kind}>`, '    </testcase>'];
}
