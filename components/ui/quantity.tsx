import { quantityParts } from './format-quantity';

interface QuantityProps {
  value: number;
  /** standard uncertainty in the unit of the value; left out or 0: the value alone */
  u?: number;
  /** as people write it */
  unit?: string;
}

/** A value with its uncertainty and unit, never broken over two lines inside itself. */
export function Quantity({ value, u, unit }: QuantityProps) {
  const parts = quantityParts(value, u);
  const body = parts.u === null ? parts.value : `${parts.value} \u00b1 ${parts.u}`;
  return (
    <span className="figures whitespace-nowrap">
      {parts.exponent !== null && parts.u !== null ? `(${body})` : body}
      {parts.exponent === null ? null : (
        <>
          {'\u2009\u00d7\u200910'}
          <sup>{String(parts.exponent).replace('-', '\u2212')}</sup>
        </>
      )}
      {unit ? `\u00a0${unit}` : null}
    </span>
  );
}
