/** Documents as people submit them, with what can be wrong or hostile in them. */
import { contractDocument } from './contract-document';

/** The small complete document with four things that are wrong. */
export function brokenDocument(): unknown {
  const document = contractDocument();
  const [series] = document.series;
  return {
    ...document,
    licence: 'mine',
    contributors: [{ name: 'R. Example', orcid: '0000-0002-1825-0098', roles: ['Investigation'] }],
    temperature: { ...document.temperature, value: 900 },
    series: [{ ...series, points: [{ ...series.points[0], u: -1 }, series.points[1]] }],
  };
}

export const MARKUP = '<img src=x onerror="document.title=\'ran\'">';
export const BRACES = '{a|b} {{constructor}}';

/** A valid document whose names are markup and templates. */
export function hostileDocument() {
  const document = contractDocument();
  document.title = `${MARKUP} title`;
  document.abstract = `${MARKUP} abstract`;
  document.ligands[0].name = `${MARKUP} ${BRACES}`;
  document.assay.readout = '<script>document.title = "ran"</script>';
  document.series[0].label = `${MARKUP} ${BRACES}`;
  document.series[0].variant = '<b>bold</b>';
  return document;
}
