/**
 * A number as a person types it: surrounding space, a true minus sign and a decimal comma are understood.
 *
 * @returns null where the text is no number
 */
export function readNumber(text: string): number | null {
  // To some 1,000 is one, to others a thousand: a thousand-fold slip must not start here.
  if (/^\s*[+\-\u2212]?[1-9]\d{0,2}(,\d{3})+\s*$/.test(text)) return null;
  const plain = text
    .trim()
    .replace(/^\u2212/, '-')
    .replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}
