/** The document that a new draft begins with: what it must have, with what only the depositor knows left open. */
import type { JsonObject } from './draft-value';

/** @param contributor name of whoever begins it */
export function emptyDocument(contributor: string): JsonObject {
  return {
    format: 'curvekeep-dataset/1',
    title: '',
    abstract: '',
    licence: 'CC-BY-4.0',
    system: '',
    contributors: [{ name: contributor, roles: [] }],
    assay: { readout: '', conditions: '' },
    temperature: { value: 25, unit: 'degC' },
    ligands: [{ id: 'ligand', name: '', unit: 'uM', concentration: 'free' }],
    normalisation: { method: 'two-reference' },
    series: [emptySeries('s1', 'ligand')],
  };
}

function emptySeries(id: string, ligand: string): JsonObject {
  const constant = { unit: 'uM' };
  return {
    id,
    label: '',
    variant: '',
    parameters: {
      origin: 'independent',
      gap: { unit: 'kT', orientation: 'inactive-minus-active' },
      siteClasses: [{ id: 'main', sites: {}, binding: [{ ligand, inactive: constant, active: constant }] }],
    },
    points: [],
  };
}
