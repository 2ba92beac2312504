/** With SHOW=1, one line a comparison on stderr (ours and simulated, with what is between them): the table of RESULTS.md. */
export function shown(what: string, ...pairs: readonly (readonly [ours: number, simulated: number])[]): void {
  if (!process.env['SHOW']) return;
  const told = pairs.map(([ours, simulated]) => `${ours.toPrecision(6)} | ${simulated.toPrecision(6)} | ${((ours / simulated - 1) * 100).toFixed(3)} %`);
  process.stderr.write(`${what} | ${told.join(' | ')}\n`);
}
