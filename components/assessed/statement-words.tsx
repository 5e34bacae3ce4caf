/** Statements as the laboratory made them, and converted, in words. */
import type { ReactNode } from 'react';
import { MINUS } from '@/components/ui/format-quantity';
import { Quantity } from '@/components/ui/quantity';
import { unitLabel } from '@/components/ui/unit-label';
import { energyStatementToKT, gapToKT } from '@/lib/engine/convert-statements';
import type { ParameterOrigin } from '@/lib/engine/inputs';
import { toKelvin } from '@/lib/engine/units';
import type { Constant, EnergyStatement, Gap, Modulator, Temperature } from '@/schemas/dataset-1.generated';

export const ORIENTATION_WORDS: Record<Gap['orientation'], string> = {
  'inactive-minus-active': `inactive ${MINUS} active`,
  'active-minus-inactive': `active ${MINUS} inactive`,
  'inactive-over-active': 'inactive / active',
  'active-over-inactive': 'active / inactive',
};

export const ORIGIN_WORDS: Record<ParameterOrigin, string> = {
  independent: 'measured independently',
  'fitted-elsewhere': 'fitted to other points',
  'fitted-here': 'fitted to these points',
};

export interface StatementWords {
  stated: ReactNode;
  /** orientation or scope, where it has one */
  convention?: string;
  /** in kT, K or the like; left out where the statement is already in it */
  converted?: ReactNode;
}

/** A gap as stated, its orientation, and its value in kT at the temperature of its series, K. */
export function gapWords(gap: Gap, temperatureKelvin: number): StatementWords {
  const { valueKT, uKT } = gapToKT(gap, temperatureKelvin);
  const convention = ORIENTATION_WORDS[gap.orientation];
  const towards = valueKT === 0 ? 'favours neither state' : `favours ${valueKT > 0 ? 'active' : 'inactive'}`;
  const stated = <Quantity value={gap.value} u={gap.u} unit={gap.unit === 'ratio' ? undefined : gap.unit} />;
  if (gap.unit === 'kT' && gap.orientation === 'inactive-minus-active') {
    return { stated, convention: `${convention}, ${towards}` };
  }
  return {
    stated: gap.unit === 'ratio' ? <>ratio {stated}</> : stated,
    convention,
    converted: (
      <>
        <Quantity value={valueKT} u={uKT} unit="kT" /> {towards}
      </>
    ),
  };
}

export function slopeWords(
  slope: EnergyStatement,
  modulator: Modulator | undefined,
  temperatureKelvin: number,
): StatementWords {
  const { valueKT, uKT } = energyStatementToKT(slope, temperatureKelvin);
  const per = `per ${modulator?.unit ?? 'unit'}`;
  const stated = (
    <>
      <Quantity value={slope.value} u={slope.u} unit={slope.unit} /> {per}
    </>
  );
  const convention = ORIENTATION_WORDS[slope.orientation];
  if (slope.unit === 'kT' && slope.orientation === 'inactive-minus-active') return { stated, convention };
  return {
    stated,
    convention,
    converted: (
      <>
        <Quantity value={valueKT} u={uKT} unit="kT" /> {per}
      </>
    ),
  };
}

export function constantWords(constant: Constant | null): StatementWords {
  if (constant === null) return { stated: 'does not bind' };
  return { stated: <Quantity value={constant.value} u={constant.u} unit={unitLabel(constant.unit)} /> };
}

export function temperatureWords({ value, unit, u }: Temperature): StatementWords {
  const stated = <Quantity value={value} u={u} unit={unitLabel(unit)} />;
  if (unit === 'K') return { stated };
  return { stated, converted: `${toKelvin(value, unit).toFixed(2)}\u00a0K` };
}
