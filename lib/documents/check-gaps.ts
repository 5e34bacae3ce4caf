import { LARGEST_KT } from '@/lib/engine/stated-ranges';
import { energyToKT, toKelvin } from '@/lib/engine/units';
import type {
  DatasetDocument,
  EnergyStatement,
  Parameters,
  RatioStatement,
  Series,
} from '@/schemas/dataset-1.generated';
import { eachSeries, type MeaningCheck, type Report } from './document-report';

/** Every series states a gap, of the whole complex or per site, and none is beyond 200 kT. */
export const checkGaps: MeaningCheck = (document, report) => {
  eachSeries(document, (series, base) => {
    const place = `${base}/parameters`;
    const kelvin = kelvinOf(series, document);
    if (!statesGap(series.parameters))
      report(`${place}/gap`, 'a series needs gap (of the whole complex) or gapPerSite (of a site class)');
    checkGap(series.parameters.gap, kelvin, `${place}/gap`, report);
    series.parameters.siteClasses.forEach(({ gapPerSite }, index) => {
      checkGap(gapPerSite, kelvin, `${place}/siteClasses/${index}/gapPerSite`, report);
    });
  });
};

/** Temperature of a series in K: its own, or the dataset's. */
export function kelvinOf(series: Series, document: DatasetDocument): number {
  const { value, unit } = series.temperature ?? document.temperature;
  return toKelvin(value, unit);
}

function statesGap({ gap, siteClasses }: Parameters): boolean {
  return gap !== undefined || siteClasses.some(({ gapPerSite }) => gapPerSite !== undefined);
}

function checkGap(
  gap: EnergyStatement | RatioStatement | undefined,
  kelvin: number,
  base: string,
  report: Report,
): void {
  if (gap === undefined) return;
  const sizeKT = Math.abs(
    gap.unit === 'ratio' ? Math.log(gap.value) : energyToKT(gap.value, gap.unit, kelvin),
  );
  if (sizeKT <= LARGEST_KT) return;
  const found = `${gap.value} ${gap.unit} is ${sizeKT.toPrecision(4)} kT`;
  report(`${base}/value`, `a gap may be at most ${LARGEST_KT} kT either way; ${found}`);
}
