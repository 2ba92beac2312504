import type { ListResult } from '../../src/intake/list.js';

/** What is wrong with a result: every row that holds something is a part or a repetition that was told, or the list is refused with its reasons. Empty when all holds. */
export function faultsOf(result: ListResult): readonly string[] {
  return result.ok ? partFaults(result) : refusalFaults(result);
}

function refusalFaults({ problems }: Extract<ListResult, { ok: false }>): string[] {
  const shapeless = problems.filter(({ code, message }) => !/^[IQ]\d{3}$/u.test(code) || message === '').map(({ code, message }) => `problem without a code or words: ${code} ${message}`);
  return problems.some(({ severity }) => severity === 'error') ? shapeless : [...shapeless, 'refused without an error'];
}

function partFaults({ parts, records, warnings }: Extract<ListResult, { ok: true }>): string[] {
  const repeated = warnings.filter(({ code }) => code === 'I401').length;
  const rows = new Set(records.map(({ row }) => row));
  const infinite = parts.flatMap(({ id, figures }) => figures.filter(({ value }) => !Number.isFinite(value)).map(({ parameter }) => `${id}: ${parameter} is no number`));
  return [
    ...(records.length === parts.length ? [] : [`${records.length} records for ${parts.length} parts`]),
    ...(new Set(parts.map(({ id }) => id)).size === parts.length ? [] : ['an id twice']),
    ...(rows.size + repeated >= parts.length ? [] : ['a row lost without a word']),
    ...infinite,
  ];
}
