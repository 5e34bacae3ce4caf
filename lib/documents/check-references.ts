import type { Point } from '@/schemas/dataset-1.generated';
import { closestWord } from './closest-word';
import { listWords, quote } from './describe-value';
import { eachSeries, type MeaningCheck, type Report } from './document-report';
import { pointerTo } from './json-pointer';

/** Every ligand and modulator that a series or one of its points names is declared by the dataset. */
export const checkReferences: MeaningCheck = (document, report) => {
  const ligands = declaredIds(document.ligands);
  const modulators = declaredIds(document.modulators ?? []);
  eachSeries(document, ({ parameters, points }, base) => {
    parameters.siteClasses.forEach(({ binding }, classIndex) => {
      binding.forEach(({ ligand }, index) => {
        if (!ligands.has(ligand))
          report(
            `${base}/parameters/siteClasses/${classIndex}/binding/${index}/ligand`,
            sayUnknown('ligand', ligand, ligands),
          );
      });
    });
    parameters.modulation?.forEach(({ modulator }, index) => {
      if (!modulators.has(modulator))
        report(
          `${base}/parameters/modulation/${index}/modulator`,
          sayUnknown('modulator', modulator, modulators),
        );
    });
    points.forEach((point, index) => {
      checkKeys(point, 'ligands', ligands, `${base}/points/${index}`, report);
      checkKeys(point, 'modulators', modulators, `${base}/points/${index}`, report);
    });
  });
};

function declaredIds(entries: { id: string }[]): Set<string> {
  const ids = new Set<string>();
  entries.forEach(({ id }) => {
    ids.add(id);
  });
  return ids;
}

function checkKeys(
  point: Point,
  list: 'ligands' | 'modulators',
  declared: Set<string>,
  base: string,
  report: Report,
): void {
  for (const id in point[list]) {
    if (!declared.has(id))
      report(
        pointerTo(base, list, id),
        sayUnknown(list === 'ligands' ? 'ligand' : 'modulator', id, declared),
      );
  }
}

function sayUnknown(kind: 'ligand' | 'modulator', id: string, declared: Set<string>): string {
  const known = [...declared].filter((one) => typeof one === 'string');
  const near = closestWord(id, known);
  if (known.length === 0) return `${kind} ${quote(id)} must be declared in ${kind}s; none is declared`;
  const hint =
    near === null
      ? `the declared ones are ${listWords(known.slice(0, 10), 'and')}`
      : `did you mean “${near}”?`;
  return `${kind} ${quote(id)} must be declared in ${kind}s; ${hint}`;
}
