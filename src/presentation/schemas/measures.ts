import * as z from 'zod';

/** A whole number of things. */
export const count = (description: string) => z.int().min(0).describe(description);

/** Both ends of something that varies; `unit` is said in the description. */
export function ends(what: string, unit: string) {
  return z.strictObject({ min: z.number().describe(`Lower end, ${unit}`), max: z.number().describe(`Upper end, ${unit}`) }).describe(`${what}, ${unit}`);
}

/** Both ends and the nominal value. */
export function span(what: string, unit: string) {
  const ofEach = { min: z.number().describe(`Lower end, ${unit}`), nominal: z.number().describe(`Nominal value, ${unit}`), max: z.number().describe(`Upper end, ${unit}`) };
  return z.strictObject(ofEach).describe(`${what}, ${unit}`);
}

/** SI unit of the numbers beside it: `V`, `A`, `V/s`, `Hz`, `V/V`, `°C`, `1` for a count, a currency for a price. */
export const unit = z.string().describe('Unit of the numbers beside it, SI: V, A, V/s, Hz, V/V, °C; 1 for a count, the ISO 4217 code for a price');

export const sha256 = z.string().regex(/^[0-9a-f]{64}$/u).describe('SHA-256, hexadecimal');
