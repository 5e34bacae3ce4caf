import type { DatasetDocument, Parameters, Series } from '@/schemas/dataset-1.generated';
import { type StatedQuantity, statedQuantities } from './stated-quantities';

/** Longest `sharedAs` label, less room for a number in brackets. */
const LONGEST_STEM = 56;

/**
 * Gives a label of its own to whatever is shared under a label but is no longer stated alike, in the series that
 * were changed. What other series state keeps its label, and so does what is still stated alike everywhere.
 *
 * @param changed ids of the series whose statements were changed
 * @param isTurned whether a quantity of a changed series now means something else even where its numbers are
 *   the same
 */
export function separateLabels(
  document: DatasetDocument,
  changed: ReadonlySet<string>,
  isTurned: (quantity: StatedQuantity) => boolean,
): DatasetDocument {
  const labels = new LabelBook();
  const variantOf = (quantity: StatedQuantity, id: string) =>
    describe(quantity, changed.has(id) && isTurned(quantity));
  const inOrder = [...document.series].sort((a, b) => Number(changed.has(a.id)) - Number(changed.has(b.id)));
  for (const { id, parameters } of inOrder) {
    for (const quantity of statedQuantities(parameters)) {
      const label = quantity.statement.sharedAs;
      if (label !== undefined) labels.note(label, variantOf(quantity, id));
    }
  }
  const relabel = (series: Series): Series => ({
    ...series,
    parameters: relabelled(series.parameters, (quantity) =>
      labels.labelFor(quantity.statement.sharedAs ?? '', variantOf(quantity, series.id)),
    ),
  });
  return { ...document, series: document.series.map((one) => (changed.has(one.id) ? relabel(one) : one)) };
}

function describe({ kind, statement }: StatedQuantity, turned: boolean): string {
  const { value, unit, orientation, u = 0 } = statement;
  return JSON.stringify([kind, value, unit, orientation, u, turned]);
}

/** Which label each variant of a shared statement carries: the first keeps it, the others get new ones. */
class LabelBook {
  private readonly known = new Set<string>();
  private readonly variants = new Map<string, string[]>();
  private readonly fresh = new Map<string, string>();

  note(label: string, variant: string): void {
    this.known.add(label);
    const variants = this.variants.get(label) ?? [];
    if (!variants.includes(variant)) this.variants.set(label, [...variants, variant]);
  }

  labelFor(label: string, variant: string): string {
    const place = this.variants.get(label)?.indexOf(variant) ?? 0;
    if (place <= 0) return label;
    const key = JSON.stringify([label, variant]);
    const found = this.fresh.get(key) ?? this.unused(label);
    this.fresh.set(key, found);
    return found;
  }

  private unused(label: string): string {
    let number = 2;
    const stem = label.slice(0, LONGEST_STEM);
    while (this.known.has(`${stem} (${number})`)) number++;
    this.known.add(`${stem} (${number})`);
    return `${stem} (${number})`;
  }
}

/** Parameters whose shared gaps and constants carry other labels; nothing else is ever read otherwise. */
function relabelled(parameters: Parameters, labelOf: (quantity: StatedQuantity) => string): Parameters {
  const labels = new Map(
    statedQuantities(parameters)
      .filter(({ statement }) => statement.sharedAs !== undefined)
      .map((quantity) => [quantity.name, labelOf(quantity)]),
  );
  const carry = <T extends object | null | undefined>(statement: T, name: string): T => {
    const sharedAs = labels.get(name);
    return sharedAs === undefined || !statement ? statement : { ...statement, sharedAs };
  };
  return {
    ...parameters,
    ...(parameters.gap === undefined ? {} : { gap: carry(parameters.gap, 'gap') }),
    siteClasses: parameters.siteClasses.map((siteClass) => ({
      ...siteClass,
      ...(siteClass.gapPerSite === undefined
        ? {}
        : { gapPerSite: carry(siteClass.gapPerSite, `${siteClass.id}/gapPerSite`) }),
      binding: siteClass.binding.map((binding) => ({
        ...binding,
        inactive: carry(binding.inactive, `${siteClass.id}/${binding.ligand}/inactive`),
        active: carry(binding.active, `${siteClass.id}/${binding.ligand}/active`),
      })),
    })),
  };
}
