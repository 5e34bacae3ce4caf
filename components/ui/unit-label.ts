import type { ConcentrationUnit, GapUnit, TemperatureUnit } from '@/lib/engine/units';

/** A unit as people write it; documents and the API write it in ASCII. */
export function unitLabel(unit: ConcentrationUnit | GapUnit | TemperatureUnit): string {
  switch (unit) {
    case 'uM':
      return '\u00b5M';
    case 'degC':
      return '\u00b0C';
    case 'ratio':
      return '';
    default:
      return unit;
  }
}
