import type { Parameters } from '@/schemas/dataset-1.generated';

/** A statement as far as it can be shared or correlated. */
export interface Statement {
  value: number;
  unit?: string;
  orientation?: string;
  u?: number;
  sharedAs?: string;
}

export type QuantityKind =
  | 'gap'
  | 'gap per site'
  | 'number of sites'
  | 'dissociation constant'
  | 'slope'
  | 'temperature';

/** One quantity that a series states. */
export interface StatedQuantity {
  /** as correlations name it: `gap`, `main/sites`, `main/velline/inactive`, `V/slope` */
  name: string;
  kind: QuantityKind;
  statement: Statement;
  /** pointer within the parameters */
  place: string;
}

/** The quantities that the parameters of a series state, in the order of the document. */
export function statedQuantities(parameters: Parameters): StatedQuantity[] {
  const quantities: StatedQuantity[] = [];
  const add = (name: string, kind: QuantityKind, place: string, statement?: Statement | null) => {
    if (statement !== undefined && statement !== null) quantities.push({ name, kind, place, statement });
  };
  add('gap', 'gap', '/gap', parameters.gap);
  parameters.siteClasses.forEach(({ id, sites, gapPerSite, binding }, index) => {
    const base = `/siteClasses/${index}`;
    add(`${id}/sites`, 'number of sites', `${base}/sites`, sites);
    add(`${id}/gapPerSite`, 'gap per site', `${base}/gapPerSite`, gapPerSite);
    binding.forEach(({ ligand, inactive, active }, entry) => {
      add(`${id}/${ligand}/inactive`, 'dissociation constant', `${base}/binding/${entry}/inactive`, inactive);
      add(`${id}/${ligand}/active`, 'dissociation constant', `${base}/binding/${entry}/active`, active);
    });
  });
  parameters.modulation?.forEach(({ modulator, slope }, index) => {
    add(`${modulator}/slope`, 'slope', `/modulation/${index}/slope`, slope);
  });
  return quantities;
}
