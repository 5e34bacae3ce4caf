import type { Correlation, Parameters } from '@/schemas/dataset-1.generated';
import { closestWord } from './closest-word';
import { CorrelationGraph } from './correlation-graph';
import { listWords, quote } from './describe-value';
import { eachSeries, type MeaningCheck, type Report } from './document-report';
import { type StatedQuantity, statedQuantities } from './stated-quantities';

/**
 * Correlations are stated once for each pair of different stated quantities, can all hold at once within a
 * series and, where quantities are shared, in the whole dataset, and agree wherever both are shared.
 */
export const checkCorrelations: MeaningCheck = (document, report) => {
  const dataset = new CorrelationGraph();
  const sharedPairs = new Map<string, { r: number; pointer: string }>();
  let possible = true;
  let sharesQuantities = false;
  eachSeries(document, ({ parameters }, base) => {
    if (parameters.correlations === undefined) return;
    const place = `${base}/parameters/correlations`;
    const pairs = resolvePairs(parameters, parameters.correlations, place, report);
    const own = new CorrelationGraph();
    for (const pair of pairs) {
      const { a, b, r } = pair;
      const [one, other] = [keyOf(a, base), keyOf(b, base)];
      if (one !== other) own.add(one, other, r);
      // A series' own quantities are taken as independent of other series given what is shared: they cannot clash there.
      const bothShared = a.statement.sharedAs !== undefined && b.statement.sharedAs !== undefined;
      sharesQuantities ||= bothShared;
      if (compareShared(sharedPairs, pair, base, report) && bothShared) dataset.add(one, other, r);
    }
    const verdict = own.canHold();
    if (verdict === 'no') report(place, IMPOSSIBLE);
    if (verdict === 'too large') report(place, TOO_MANY);
    if (verdict !== 'yes') possible = false;
  });
  if (possible && sharesQuantities) reportDataset(dataset, report);
};

const IMPOSSIBLE =
  'these correlations cannot all hold at once (their matrix is not positive semi-definite); some must be nearer to 0';

const TOO_MANY = 'too many correlated quantities hang together to be judged; state fewer correlations';

function reportDataset(dataset: CorrelationGraph, report: Report): void {
  const verdict = dataset.canHold();
  if (verdict === 'no') report('/series', `with what is shared between series, ${IMPOSSIBLE}`);
  if (verdict === 'too large') report('/series', TOO_MANY);
}

interface Pair {
  a: StatedQuantity;
  b: StatedQuantity;
  r: number;
  pointer: string;
}

/** The pairs that stand for two different stated quantities; what is wrong with the others is reported. */
function resolvePairs(
  parameters: Parameters,
  correlations: Correlation[],
  place: string,
  report: Report,
): Pair[] {
  const quantities = new Map(statedQuantities(parameters).map((quantity) => [quantity.name, quantity]));
  const firsts = new Map<string, number>();
  const pairs: Pair[] = [];
  correlations.forEach(({ a, b, r }, index) => {
    const pointer = `${place}/${index}`;
    const [first, second] = [quantities.get(a), quantities.get(b)];
    if (first === undefined) report(`${pointer}/a`, sayUnknown(a, quantities));
    if (second === undefined) report(`${pointer}/b`, sayUnknown(b, quantities));
    if (first === undefined || second === undefined) return;
    const key = a < b ? `${a} ${b}` : `${b} ${a}`;
    const earlier = firsts.get(key);
    firsts.set(key, earlier ?? index);
    if (a === b) report(`${pointer}/b`, 'a correlation is between two different quantities');
    else if (earlier === undefined) pairs.push({ a: first, b: second, r, pointer });
    else report(pointer, `${a} and ${b} already stand at ${place}/${earlier}; state each pair once`);
  });
  return pairs;
}

function sayUnknown(name: string, quantities: Map<string, StatedQuantity>): string {
  const names = [...quantities.keys()];
  const near = closestWord(name, names);
  const hint =
    near === null ? `it states ${listWords(names.slice(0, 12), 'and')}` : `did you mean “${near}”?`;
  return `${quote(name)} is no quantity that this series states; ${hint}`;
}

/** A shared quantity is one and the same in all series. */
function keyOf({ name, statement }: StatedQuantity, base: string): string {
  return statement.sharedAs === undefined ? `${base} ${name}` : `shared ${statement.sharedAs}`;
}

function nameOf({ name, statement }: StatedQuantity): string {
  return statement.sharedAs === undefined ? name : `the shared quantity ${quote(statement.sharedAs)}`;
}

/** Whether this correlation is new to the dataset. One that disagrees with an earlier one is reported. */
function compareShared(
  known: Map<string, { r: number; pointer: string }>,
  { a, b, r, pointer }: Pair,
  base: string,
  report: Report,
): boolean {
  const [one, other] = [keyOf(a, base), keyOf(b, base)];
  if (one === other) {
    if (r !== 1) report(`${pointer}/r`, `${nameOf(a)} is one and the same quantity, so r must be 1`);
    return false;
  }
  const key = JSON.stringify(one < other ? [one, other] : [other, one]);
  const earlier = known.get(key);
  if (earlier === undefined) {
    known.set(key, { r, pointer });
    return true;
  }
  if (earlier.r !== r)
    report(
      `${pointer}/r`,
      `${nameOf(a)} and ${nameOf(b)} have r = ${earlier.r} at ${earlier.pointer}; it must be the same here`,
    );
  return false;
}
