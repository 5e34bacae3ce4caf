import { CONCENTRATION_UNITS, type ConcentrationUnit, concentrationKind } from '@/lib/engine/units';
import type { Binding, Constant, Ligand } from '@/schemas/dataset-1.generated';
import { concentrationRange, sayKind } from './concentration-range';
import { quote } from './describe-value';
import { eachSeries, type MeaningCheck, type Report } from './document-report';

/** Dissociation constants are of their ligand's kind, concentration or pressure, and of a believable size. */
export const checkUnits: MeaningCheck = (document, report) => {
  const units = unitsOfLigands(document.ligands);
  eachSeries(document, ({ parameters }, base) => {
    parameters.siteClasses.forEach(({ binding }, classIndex) => {
      binding.forEach((entry, index) => {
        checkBinding(entry, units, `${base}/parameters/siteClasses/${classIndex}/binding/${index}`, report);
      });
    });
  });
};

/** The unit of each ligand by id; a ligand whose unit is none of ours is left out. */
export function unitsOfLigands(ligands: Ligand[]): Map<string, ConcentrationUnit> {
  const units = new Map<string, ConcentrationUnit>();
  ligands.forEach(({ id, unit }) => {
    if (CONCENTRATION_UNITS.includes(unit)) units.set(id, unit);
  });
  return units;
}

function checkBinding(
  binding: Binding,
  units: Map<string, ConcentrationUnit>,
  base: string,
  report: Report,
): void {
  for (const state of ['inactive', 'active'] as const) {
    const constant = binding[state];
    if (constant === null) continue;
    checkConstant(constant, `${base}/${state}`, report);
    const unit = units.get(binding.ligand);
    if (unit === undefined || concentrationKind(unit) === concentrationKind(constant.unit)) continue;
    const detail = `ligand ${quote(binding.ligand)} is given in ${unit}, so its constant must be ${sayKind(unit)}`;
    report(`${base}/${state}/unit`, `${detail}; found ${constant.unit}`);
  }
}

function checkConstant({ value, unit }: Constant, base: string, report: Report): void {
  const { lowest, highest, words } = concentrationRange(unit);
  if (value >= lowest && value <= highest) return;
  report(`${base}/value`, `a dissociation constant must be ${words}; found ${value} ${unit}`);
}
