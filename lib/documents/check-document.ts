import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { checkMeaning } from './check-meaning';
import { collectSchemaErrors, fitsSchema, tooManyPoints } from './check-schema';
import type { DocumentError } from './document-error';
import { type ErrorList, listErrors, MOST_ERRORS } from './error-list';
import { setAsideBroken } from './set-aside-broken';
import { MOST_POINTS, MOST_SERIES } from './size-limits';

export type CheckedDocument =
  | { ok: true; document: DatasetDocument }
  | { ok: false; errors: DocumentError[] };

/**
 * Judges a value as a dataset document, by schema and by meaning. All errors come at once: where some pieces
 * break the schema, the meaning of the others is still judged.
 *
 * @param value anything that JSON can hold
 */
export function checkDocument(value: unknown): CheckedDocument {
  const errors = fitsSchema(value) ? judgeFitting(value) : judgeBroken(value);
  return errors.count() === 0
    ? { ok: true, document: value as DatasetDocument }
    : { ok: false, errors: errors.toArray() };
}

function judgeFitting(document: DatasetDocument): ErrorList {
  const errors = listErrors();
  checkMeaning(document, (pointer, detail) => errors.add(pointer, () => detail));
  return errors;
}

function judgeBroken(value: unknown): ErrorList {
  const errors = collectSchemaErrors(value);
  const broken = errors.toArray();
  if (errors.count() > MOST_ERRORS) return errors;
  const points = countPoints(value);
  if (points === null) return errors;
  if (points > MOST_POINTS) {
    errors.add('/series', () => tooManyPoints(points));
    return errors;
  }
  const rest = setAsideBroken(
    value,
    broken.filter(({ detail }) => !detail.startsWith('unknown property')).map(({ pointer }) => pointer),
  );
  if (rest === null) return errors;
  checkMeaning(rest, (pointer, detail) => {
    if (!broken.some((error) => concernsSame(error.pointer, pointer))) errors.add(pointer, () => detail);
  });
  return errors;
}

/** All points of the document, bad ones too; null where its series cannot be told apart. */
function countPoints(value: unknown): number | null {
  const series = (value as { series?: unknown } | null)?.series;
  if (!Array.isArray(series) || series.length > MOST_SERIES) return null;
  return series.reduce<number>((sum, one) => sum + (Array.isArray(one?.points) ? one.points.length : 0), 0);
}

/** Whether what meaning says of one place only follows from what the schema says of the other. */
function concernsSame(broken: string, pointer: string): boolean {
  return broken === pointer || broken.startsWith(`${pointer}/`);
}
