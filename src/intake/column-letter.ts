/** The letter a spreadsheet gives a column: 1 is A, 27 is AA. */
export function columnLetter(number: number): string {
  let letters = '';
  for (let left = number; left > 0; left = Math.floor((left - 1) / 26)) {
    letters = String.fromCharCode(65 + ((left - 1) % 26)) + letters;
  }
  return letters;
}
