/** An exact constant with all its digits, as mantissa × 10ⁿ. */
export function PowerOfTen({ value, unit }: { value: number; unit: string }) {
  const [mantissa, exponent] = value.toExponential().split('e');
  return (
    <span className="figures whitespace-nowrap">
      {mantissa}
      {'\u2009\u00d7\u200910'}
      <sup>{exponent.replace('+', '').replace('-', '\u2212')}</sup>
      {`\u00a0${unit}`}
    </span>
  );
}
