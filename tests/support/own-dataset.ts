/** Datasets of a tester's own making: points put on the curve by the textbook formula, some pushed off it. */
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

interface Own {
  title: string;
  /** energy gap without ligand, inactive − active, kT */
  gap: number;
  /** points pushed off the curve: index in the series → by how much, in activity */
  pushed: Record<number, number>;
}

const SITES = 6;
const INACTIVE_UM = 18;
const ACTIVE_UM = 900;
const CONCENTRATIONS_UM = [0, 1, 2, 4, 6, 8, 10, 13, 16, 20, 30, 60];
const U = 0.02;

/** A valid document of one series on a system that the demonstration lists. */
export function ownDataset({ title, gap, pushed }: Own): DatasetDocument {
  return {
    format: 'curvekeep-dataset/1',
    title,
    abstract: 'Invented by a test.',
    licence: 'CC0-1.0',
    system: 'alrq-velline',
    contributors: [{ name: 'T. Tester', roles: ['Investigation'] }],
    assay: { readout: 'FRET pair ratio', conditions: 'pH 7.4' },
    temperature: { value: 25, unit: 'degC' },
    ligands: [{ id: 'velline', name: 'velline', unit: 'uM', concentration: 'free' }],
    normalisation: { method: 'two-reference' },
    series: [
      {
        id: 'own',
        label: 'own variant',
        variant: 'T1A',
        parameters: {
          origin: 'independent',
          gap: { value: gap, unit: 'kT', orientation: 'inactive-minus-active' },
          siteClasses: [
            {
              id: 'main',
              sites: { value: SITES },
              binding: [
                {
                  ligand: 'velline',
                  inactive: { value: INACTIVE_UM, unit: 'uM' },
                  active: { value: ACTIVE_UM, unit: 'uM' },
                },
              ],
            },
          ],
        },
        points: CONCENTRATIONS_UM.map((c, i) => ({
          ligands: { velline: c },
          activity: Number((expectedActivity(gap, c) + (pushed[i] ?? 0)).toFixed(4)),
          u: U,
        })),
      },
    ],
  };
}

/** p(f) with f = gap − n ln((1 + c/K_I) / (1 + c/K_A)): Monod, Wyman & Changeux, J. Mol. Biol. 12, 88 (1965). */
function expectedActivity(gap: number, c: number): number {
  const f = gap - SITES * Math.log((1 + c / INACTIVE_UM) / (1 + c / ACTIVE_UM));
  return 1 / (1 + Math.exp(-f));
}
