/** Sums and shifts of numbers as they were written: with the digits that were given and no others. */

/** More decimals than anybody writes; beyond them the plain difference is as good. */
const MOST_DECIMALS = 20;

/** 1 − value with as many decimals as the value was written with: of 0.91 it is 0.09, not 0.08999999999999997. */
export function complementOf(value: number): number {
  const decimals = decimalsOf(value);
  return decimals > MOST_DECIMALS ? 1 - value : Number((1 - value).toFixed(decimals));
}

/** value · 10^exponent with the very digits of the value: of 0.07 and 3 it is 70, not 70.00000000000001. */
export function shiftDecimalPoint(value: number, exponent: number): number {
  const [digits, power = '0'] = String(value).split('e');
  return Number(`${digits}e${Number(power) + exponent}`);
}

function decimalsOf(value: number): number {
  const [digits, power = '0'] = String(value).split('e');
  const fraction = digits?.split('.')[1] ?? '';
  return Math.max(0, fraction.length - Number(power));
}
