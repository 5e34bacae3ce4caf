import { quote } from './describe-value';
import { eachSeries, type MeaningCheck, type Report } from './document-report';
import { type QuantityKind, type Statement, statedQuantities } from './stated-quantities';

interface FirstUse {
  pointer: string;
  kind: QuantityKind;
  statement: Statement;
}

/** Quantities that carry the same `sharedAs` are of one kind and stated alike, in the whole dataset. */
export const checkSharedStatements: MeaningCheck = (document, report) => {
  const firsts = new Map<string, FirstUse>();
  compare(firsts, { pointer: '/temperature', kind: 'temperature', statement: document.temperature }, report);
  eachSeries(document, ({ temperature, parameters }, base) => {
    if (temperature !== undefined)
      compare(
        firsts,
        { pointer: `${base}/temperature`, kind: 'temperature', statement: temperature },
        report,
      );
    for (const { kind, statement, place } of statedQuantities(parameters))
      compare(firsts, { pointer: `${base}/parameters${place}`, kind, statement }, report);
  });
};

function compare(firsts: Map<string, FirstUse>, use: FirstUse, report: Report): void {
  const label = use.statement.sharedAs;
  if (label === undefined) return;
  const first = firsts.get(label);
  if (first === undefined) firsts.set(label, use);
  else if (first.kind !== use.kind)
    report(
      `${use.pointer}/sharedAs`,
      `${quote(label)} is the label of a ${first.kind} at ${first.pointer}; a ${use.kind} needs another label`,
    );
  else if (!statedAlike(first.statement, use.statement))
    report(
      use.pointer,
      `what is shared as ${quote(label)} must be stated as at ${first.pointer}; otherwise give it another label`,
    );
}

function statedAlike(one: Statement, other: Statement): boolean {
  return (
    one.value === other.value &&
    one.unit === other.unit &&
    one.orientation === other.orientation &&
    (one.u ?? 0) === (other.u ?? 0)
  );
}
