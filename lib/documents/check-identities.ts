import { quote } from './describe-value';
import { eachSeries, type MeaningCheck, type Report } from './document-report';

/** Ligands, modulators and series have ids of their own; so have the site classes of a series. */
export const checkIdentities: MeaningCheck = (document, report) => {
  reportRepeats(document.ligands, 'ligand', '/ligands', 'id', report);
  reportRepeats(document.modulators ?? [], 'modulator', '/modulators', 'id', report);
  reportRepeats(document.series, 'series', '/series', 'id', report);
  eachSeries(document, ({ parameters }, base) => {
    const classes = `${base}/parameters/siteClasses`;
    reportRepeats(parameters.siteClasses, 'site class', classes, 'id', report);
    reportRepeats(
      parameters.modulation ?? [],
      'modulation',
      `${base}/parameters/modulation`,
      'modulator',
      report,
    );
    parameters.siteClasses.forEach(({ binding }, index) => {
      reportRepeats(binding, 'binding', `${classes}/${index}/binding`, 'ligand', report);
    });
  });
};

const RULES: Record<string, string> = {
  binding: 'a site class states the binding of a ligand once',
  modulation: 'a series states the slope of a modulator once',
};

function reportRepeats<Key extends string>(
  entries: { [key in Key]: string }[],
  kind: string,
  base: string,
  key: Key,
  report: Report,
): void {
  const firsts = new Map<string, number>();
  entries.forEach((entry, index) => {
    const id = entry[key];
    if (typeof id !== 'string') return;
    const first = firsts.get(id);
    if (first === undefined) firsts.set(id, index);
    else {
      const rule = RULES[kind] ?? `each ${kind} needs an id of its own`;
      report(`${base}/${index}/${key}`, `${quote(id)} already stands at ${base}/${first}; ${rule}`);
    }
  });
}
