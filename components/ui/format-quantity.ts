/**
 * Numbers as they are shown: with a true minus sign, and with as many digits as their uncertainty justifies
 * (JCGM 100, 7.2.6: the uncertainty to two significant digits, the value to the same place).
 */

export const MINUS = '\u2212';
const THIN_SPACE = '\u2009';
const SUPERSCRIPTS = '\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079';
/** Powers of ten beyond which a number is written with an exponent. */
const LARGEST_PLAIN_EXPONENT = 4;
const SMALLEST_PLAIN_EXPONENT = -3;
/** Below this share of the value an uncertainty is arithmetic noise and is treated as 0. */
const NEGLIGIBLE_RELATIVE_U = 1e-9;
/** What Number.prototype.toFixed takes. */
const MOST_DECIMALS = 100;

export interface QuantityParts {
  /** the value, or its mantissa where there is an exponent */
  value: string;
  /** the standard uncertainty on the same scale; null where there is none */
  u: string | null;
  /** power of ten that both are multiplied by; null where none is written */
  exponent: number | null;
}

/** The power of ten of a number's first digit after rounding to `digits` significant digits; 0 for 0. */
function exponentOf(value: number, digits: number): number {
  return value === 0 ? 0 : Number(value.toExponential(digits - 1).split('e')[1]);
}

/** Digits with a true minus sign; a value that rounds to zero has no sign. */
function signed(text: string): string {
  if (!text.startsWith('-')) return text;
  return /[1-9]/.test(text) ? `${MINUS}${text.slice(1)}` : text.slice(1);
}

/**
 * A number to so many decimals; a negative count rounds to tens, hundreds and so on.
 */
export function formatFixed(value: number, decimals: number): string {
  if (decimals >= 0) return signed(value.toFixed(Math.min(decimals, MOST_DECIMALS)));
  const place = 10 ** -decimals;
  return signed((Math.round(value / place) * place).toFixed(0));
}

const needsExponent = (exponent: number) =>
  exponent > LARGEST_PLAIN_EXPONENT || exponent < SMALLEST_PLAIN_EXPONENT;

function significantParts(value: number, digits: number): QuantityParts {
  const exponent = exponentOf(value, digits);
  if (!needsExponent(exponent)) {
    return { value: signed(String(Number(value.toPrecision(digits)))), u: null, exponent: null };
  }
  const mantissa = value.toExponential(digits - 1).split('e')[0];
  return { value: signed(String(Number(mantissa))), u: null, exponent };
}

/** `x` with its decimal point moved, exactly as one would write it: no rounding beyond that of the result. */
function shiftPoint(x: number, places: number): number {
  const [mantissa, exponent] = x.toExponential().split('e');
  return Number(`${mantissa}e${Number(exponent) + places}`);
}

/**
 * What is written of a value and its standard uncertainty.
 *
 * @param value finite
 * @param u ≥ 0, in the unit of the value; 0 or left out: the value alone, to at most four significant digits
 */
export function quantityParts(value: number, u = 0): QuantityParts {
  if (u <= Math.abs(value) * NEGLIGIBLE_RELATIVE_U) return significantParts(value, 4);
  const decimals = 1 - exponentOf(u, 2);
  const rounded = decimals >= 0 && decimals <= MOST_DECIMALS ? Number(value.toFixed(decimals)) : value;
  const exponent = Math.max(rounded === 0 ? -Infinity : exponentOf(rounded, 15), exponentOf(u, 2));
  if (!needsExponent(exponent)) {
    return { value: formatFixed(value, decimals), u: formatFixed(u, decimals), exponent: null };
  }
  const onScale = (x: number) => formatFixed(shiftPoint(x, -exponent), decimals + exponent);
  return { value: onScale(value), u: onScale(u), exponent };
}

function superscript(exponent: number): string {
  const digits = [...String(Math.abs(exponent))].map((digit) => SUPERSCRIPTS[Number(digit)]).join('');
  return exponent < 0 ? `\u207b${digits}` : digits;
}

/**
 * A quantity as one line of text, for labels, plots and what is read aloud.
 *
 * @param unit as people write it, or left out
 */
export function formatQuantity(value: number, u = 0, unit = ''): string {
  const parts = quantityParts(value, u);
  const tail = unit ? `\u00a0${unit}` : '';
  if (parts.exponent === null) return `${parts.value}${parts.u === null ? '' : ` \u00b1 ${parts.u}`}${tail}`;
  const body = parts.u === null ? parts.value : `(${parts.value} \u00b1 ${parts.u})`;
  return `${body}${THIN_SPACE}\u00d7${THIN_SPACE}10${superscript(parts.exponent)}${tail}`;
}

/** A number that is exactly known or whose uncertainty stands elsewhere: at most four significant digits. */
export function formatNumber(value: number): string {
  return formatQuantity(value);
}

/** A score (z, RMS z) or a Q: two decimals while it is small, whole once it is beyond doubt. */
export function formatScore(score: number): string {
  const size = Math.abs(score);
  if (size >= 1e5) return formatNumber(score);
  return formatFixed(score, size < 10 ? 2 : size < 100 ? 1 : 0);
}

/** A p-value or q: two significant digits, `<0.001` below that, `>0.99` where they would round to 1, a dash where there is none. */
export function formatPValue(p: number | null): string {
  if (p === null) return '\u2013';
  if (p < 0.001) return '<0.001';
  return p >= 0.995 ? '>0.99' : p.toPrecision(2);
}

/** How many, with a comma between thousands. */
export function formatCount(count: number): string {
  return signed(count.toLocaleString('en-GB'));
}
