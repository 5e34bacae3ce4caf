import type { DatasetDocument } from '@/schemas/dataset-1.generated';

/** The small complete document by which the format is explained. Invented. A new one at each call. */
export function contractDocument(): DatasetDocument {
  return {
    format: 'curvekeep-dataset/1',
    title: 'Velline response of AlrQ, wild type and one hinge variant',
    abstract: 'Invented example.',
    licence: 'CC-BY-4.0',
    system: 'alrq-velline',
    contributors: [{ name: 'R. Example', orcid: '0000-0002-1825-0097', roles: ['Investigation'] }],
    assay: { readout: 'FRET pair ratio', conditions: 'pH 7.4, 150 mM KCl' },
    temperature: { value: 25, unit: 'degC', u: 0.5 },
    ligands: [
      {
        id: 'velline',
        name: 'velline',
        unit: 'uM',
        concentration: 'free',
        relativeU: 0.03,
        stockRelativeU: 0.02,
      },
    ],
    modulators: [{ id: 'V', name: 'membrane potential', unit: 'mV' }],
    normalisation: { method: 'two-reference', note: '0: full inhibitor; 1: constitutive variant' },
    series: [
      {
        id: 'wt',
        label: 'wild type',
        variant: 'wild type',
        parameters: {
          origin: 'independent',
          gap: { value: 2.4, unit: 'kT', orientation: 'inactive-minus-active', u: 0.1 },
          siteClasses: [
            {
              id: 'main',
              sites: { value: 6 },
              binding: [
                {
                  ligand: 'velline',
                  inactive: { value: 18, unit: 'uM', u: 1.2 },
                  active: { value: 0.9, unit: 'mM', u: 0.08 },
                },
              ],
            },
          ],
          modulation: [
            {
              modulator: 'V',
              slope: { value: 0.02, unit: 'kT', orientation: 'inactive-minus-active', u: 0.002 },
              reference: 0,
            },
          ],
          correlations: [{ a: 'gap', b: 'main/velline/inactive', r: -0.3 }],
        },
        points: [
          { ligands: { velline: 0 }, modulators: { V: 0 }, activity: 0.91, u: 0.02 },
          { ligands: { velline: 12.5 }, replicates: [0.41, 0.44, 0.4] },
        ],
      },
    ],
  };
}
