/** Runs are numbered from 1 within their sounding and shown as A, B, … Z, AA, AB, … */
export function runLetter(number: number): string {
  if (!Number.isInteger(number) || number < 1)
    throw new RangeError(`run number ${number}: must be a whole number from 1`);
  let rest = number;
  let letters = '';
  while (rest > 0) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
    rest = Math.floor((rest - 1) / 26);
  }
  return letters;
}
