/** Currency codes of ISO 4217 in use for component prices; from memory. */
const CODES = new Set(
  (
    'AED ARS AUD BGN BRL CAD CHF CLP CNY COP CZK DKK EGP EUR GBP HKD HUF IDR ILS INR ISK JPY KRW KZT MAD MXN MYR NOK NZD ' +
    'PEN PHP PKR PLN QAR RON RSD SAR SEK SGD THB TND TRY TWD UAH USD VND ZAR'
  ).split(' '),
);

/** The ISO 4217 code a currency is written with, `€` included; null when it is none. */
export function findCurrency(text: string): { code: string; wrongCase: boolean } | null {
  if (text === '€') return { code: 'EUR', wrongCase: false };
  const code = text.toUpperCase();
  return CODES.has(code) ? { code, wrongCase: code !== text } : null;
}
