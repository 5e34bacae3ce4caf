/** Shapes as a person would say them. Pure. */
import { formatNumber, formatQuantity, MINUS } from '@/components/ui/format-quantity';
import type { Shape, ShapeAlternative, ShapeEstimateName } from '@/lib/engine/assessment';
import type { ReadingWords } from './reading-words';

/** The alternative that is named, in words; null where none is. */
export function shapeWords(shape: Shape): (ReadingWords & { more: string }) | null {
  const best = namedAlternative(shape);
  if (best === null) return null;
  const estimates = new Map(best.estimates.map(({ name, value, u }) => [name, { value, u }]));
  const written = (name: ShapeEstimateName, unit = '') => {
    const { value, u } = estimates.get(name) ?? { value: 0, u: 0 };
    return formatQuantity(value, u, unit);
  };
  const brief = (name: ShapeEstimateName) => short(estimates.get(name)?.value ?? 0);
  switch (best.kind) {
    case 'offset': {
      const strong = written('offset', 'kT');
      return words(`An offset of ${strong}`, strong, `offset ${brief('offset')} kT`, allowance(shape));
    }
    case 'slope': {
      const strong = `${written('slope')} times`;
      return words(`A response ${strong} as steep as stated (a slope)`, strong, `slope ${brief('slope')}`);
    }
    case 'ceiling': {
      const strong = written('ceiling');
      return words(`A ceiling at ${strong}, in place of 1,`, strong, `ceiling ${brief('ceiling')}`);
    }
    case 'floor': {
      const strong = written('floor');
      return words(`A floor at ${strong}, in place of 0,`, strong, `floor ${brief('floor')}`);
    }
    case 'stock': {
      const strong = `${written('stock')} times`;
      return words(`A stock ${strong} as concentrated as stated`, strong, `stock × ${brief('stock')}`);
    }
    case 'offset+slope': {
      const strong = written('offset', 'kT');
      return words(
        `An offset of ${strong} together with a response ${written('slope')} times as steep as stated`,
        strong,
        `offset ${brief('offset')} kT, slope ${brief('slope')}`,
        allowance(shape),
      );
    }
    case 'floor+ceiling': {
      const strong = `${written('floor')} and a ceiling at ${written('ceiling')}`;
      return words(
        `A floor at ${strong}, in place of 0 and 1,`,
        strong,
        `floor ${brief('floor')}, ceiling ${brief('ceiling')}`,
      );
    }
  }
}

/** The alternative that `best` names, where it names one. */
export function namedAlternative({ best, alternatives }: Shape): ShapeAlternative | null {
  return alternatives.find(({ kind }) => kind === best) ?? null;
}

function words(doing: string, strong: string, brief: string, more = '') {
  const [first = '', ...rest] = doing;
  return {
    doing,
    strong,
    noun: `${first.toLowerCase()}${rest.join('')}`.replace(/,$/, ''),
    short: brief,
    more,
  };
}

/** What the offset is to be compared with. */
function allowance({ allowedByStatements }: Shape): string {
  if (allowedByStatements < 1e-4) return 'the statements carry no uncertainty that would allow one';
  return `the stated uncertainties alone explain about ${twoDigits(allowedByStatements)}\u00a0kT (one standard uncertainty)`;
}

function twoDigits(value: number): string {
  return formatNumber(Number(value.toPrecision(2)));
}

/** Two significant digits with a true minus sign, without trailing zeros beyond them. */
function short(value: number): string {
  return value.toPrecision(2).replace('-', MINUS);
}
