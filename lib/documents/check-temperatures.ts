import { toKelvin } from '@/lib/engine/units';
import type { Temperature } from '@/schemas/dataset-1.generated';
import { eachSeries, type MeaningCheck, type Report } from './document-report';

const LOWEST_KELVIN = 200;
const HIGHEST_KELVIN = 450;
/** so that -73.15 °C passes as 200 K in spite of rounding, K */
const ROUNDING_KELVIN = 1e-9;

/** Temperatures lie between 200 and 450 K. */
export const checkTemperatures: MeaningCheck = (document, report) => {
  checkTemperature(document.temperature, '/temperature', report);
  eachSeries(document, ({ temperature }, base) => {
    if (temperature !== undefined) checkTemperature(temperature, `${base}/temperature`, report);
  });
};

function checkTemperature({ value, unit }: Temperature, base: string, report: Report): void {
  const kelvin = toKelvin(value, unit);
  if (kelvin >= LOWEST_KELVIN - ROUNDING_KELVIN && kelvin <= HIGHEST_KELVIN + ROUNDING_KELVIN) return;
  const range = unit === 'K' ? '200 to 450 K' : '-73.15 to 176.85 degC (200 to 450 K)';
  report(`${base}/value`, `temperature must be ${range}; found ${value} ${unit}`);
}
