import { LARGEST_KT, LARGEST_RELATIVE_U } from '@/lib/engine/stated-ranges';
import { energyToKT } from '@/lib/engine/units';
import { kelvinOf } from './check-gaps';
import { eachSeries, type MeaningCheck, type Report } from './document-report';
import { type Statement, statedQuantities } from './stated-quantities';

/** u of a temperature, K: as wide as the temperatures that are taken. */
const MOST_TEMPERATURE_U = 250;

/** Standard uncertainties are of a size that a computation can carry. */
export const checkUncertainties: MeaningCheck = (document, report) => {
  checkTemperatureU(document.temperature.u, '/temperature/u', report);
  eachSeries(document, (series, base) => {
    checkTemperatureU(series.temperature?.u, `${base}/temperature/u`, report);
    const kelvin = kelvinOf(series, document);
    for (const { kind, statement, place } of statedQuantities(series.parameters)) {
      const at = `${base}/parameters${place}/u`;
      const isEnergy =
        (kind === 'gap' || kind === 'gap per site' || kind === 'slope') && statement.unit !== 'ratio';
      if (isEnergy) checkEnergyU(statement, kelvin, at, report);
      else checkRelativeU(statement, at, report);
    }
  });
};

function checkTemperatureU(u: number | undefined, pointer: string, report: Report): void {
  if (u !== undefined && u > MOST_TEMPERATURE_U)
    report(pointer, `u of a temperature may be at most ${MOST_TEMPERATURE_U} K; found ${u}`);
}

function checkEnergyU({ u = 0, unit }: Statement, kelvin: number, pointer: string, report: Report): void {
  if (u === 0) return;
  const uKT = energyToKT(u, unit as 'kT', kelvin);
  if (uKT > LARGEST_KT)
    report(
      pointer,
      `u of an energy may be at most ${LARGEST_KT} kT; ${u} ${unit} is ${uKT.toPrecision(4)} kT`,
    );
}

function checkRelativeU({ u = 0, value }: Statement, pointer: string, report: Report): void {
  if (u > LARGEST_RELATIVE_U * value)
    report(pointer, `u may be at most ${LARGEST_RELATIVE_U} times the value ${value}; found ${u}`);
}
