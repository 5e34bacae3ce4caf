/** Statements of a draft in kT, as far as they can be read. */
import type { ReactNode } from 'react';
import { gapWords } from '@/components/assessed/statement-words';
import { ENERGY_ORIENTATIONS, GAP_UNITS, RATIO_ORIENTATIONS, toKelvin } from '@/lib/engine/units';
import type { Gap } from '@/schemas/dataset-1.generated';
import { isObject } from './draft-value';

const within = (list: readonly string[], value: unknown) => typeof value === 'string' && list.includes(value);

/** Absolute temperature of a statement of a draft, K; null where it is none. */
export function kelvinOf(temperature: unknown): number | null {
  if (!isObject(temperature)) return null;
  const { value, unit } = temperature;
  if (typeof value !== 'number' || (unit !== 'K' && unit !== 'degC')) return null;
  const kelvin = toKelvin(value, unit);
  return kelvin > 0 ? kelvin : null;
}

/** A gap of a draft in kT with what it favours; null where it cannot be read as one. */
export function gapInKT(gap: unknown, kelvin: number | null): ReactNode {
  if (!isGap(gap) || kelvin === null) return null;
  const plain: Gap = { ...gap, u: typeof gap.u === 'number' && gap.u >= 0 ? gap.u : undefined };
  const { converted, stated, convention } = gapWords(plain, kelvin);
  // A gap stated in kT that way round is not converted; its convention says what it favours.
  return (
    converted ?? (
      <>
        {stated} {convention?.split(', ')[1]}
      </>
    )
  );
}

function isGap(gap: unknown): gap is Gap {
  if (!isObject(gap)) return false;
  const { value, unit, orientation } = gap;
  if (typeof value !== 'number' || !Number.isFinite(value) || !within(GAP_UNITS, unit)) return false;
  if (unit === 'ratio') return value > 0 && within(RATIO_ORIENTATIONS, orientation);
  return within(ENERGY_ORIENTATIONS, orientation);
}
