import { Ajv2020, type ErrorObject, type ValidateFunction } from 'ajv/dist/2020.js';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import schema from '@/schemas/dataset-1.schema.json';
import { boundWork } from './bound-work';
import { withThousands } from './describe-value';
import type { DocumentError } from './document-error';
import { type ErrorList, listErrors } from './error-list';
import { explainSchemaError, placeOfSchemaError } from './explain-schema-error';
import { MOST_POINTS, MOST_SERIES } from './size-limits';

/** Stops at the first complaint: quick, and enough for a valid document. */
const quick = new Ajv2020({ strict: true, strictTuples: false, schemas: [schema] });
/** Collects every complaint with what it concerns. Only bad pieces of a document reach it. */
const thorough = new Ajv2020({
  strict: true,
  strictTuples: false,
  allErrors: true,
  verbose: true,
  schemas: [schema],
});

type Piece = 'document' | 'series' | 'point';
const validators = new Map<string, ValidateFunction>();

/** Compiled at the first use, once. */
function validator(ajv: Ajv2020, piece: Piece): ValidateFunction {
  const key = `${ajv === quick ? 'quick' : 'thorough'} ${piece}`;
  const known = validators.get(key);
  if (known !== undefined) return known;
  const made = ajv.compile({ $ref: piece === 'document' ? schema.$id : `${schema.$id}#/$defs/${piece}` });
  validators.set(key, made);
  return made;
}

/** Whether a value is a dataset document by the schema alone. Meaning is judged by `check-meaning.ts`. */
export function fitsSchema(value: unknown): value is DatasetDocument {
  return validator(quick, 'document')(value);
}

/**
 * Everything in which a value departs from `dataset-1.schema.json`, one error a place, in the order of the
 * document; the list is cut where it grows long, and then its last entry says how many more there are.
 *
 * A bad document is judged piece by piece, since one pass over millions of bad entries would collect
 * millions of complaints before anything could cut them.
 */
export function checkSchema(value: unknown): DocumentError[] {
  return fitsSchema(value) ? [] : collectSchemaErrors(value).toArray();
}

/** As `checkSchema`, for a value that does not fit, in a list that can take more errors. */
export function collectSchemaErrors(value: unknown): ErrorList {
  const errors = listErrors();
  if (!isRecord(value) || !Array.isArray(value.series)) {
    judge('document', boundWork(value), '', errors);
    return errors;
  }
  judge('document', boundWork(value, { series: [] }), '', errors, '/series');
  const series: unknown[] = value.series;
  if (series.length === 0) errors.add('/series', () => 'series must hold at least 1');
  if (series.length > MOST_SERIES) errors.add('/series', () => tooManySeries(series.length));
  judgeSeries(series.slice(0, MOST_SERIES), errors);
  return errors;
}

function judgeSeries(series: unknown[], errors: ErrorList): void {
  let pointsLeft = MOST_POINTS;
  series.forEach((one, index) => {
    const base = `/series/${index}`;
    if (!isRecord(one) || !Array.isArray(one.points)) {
      judge('series', boundWork(one), base, errors);
      return;
    }
    judge('series', boundWork(one, { points: [] }), base, errors);
    const points: unknown[] = one.points;
    if (points.length > MOST_POINTS) errors.add(`${base}/points`, () => tooManyPoints(points.length));
    judgePoints(points.slice(0, pointsLeft), `${base}/points`, errors);
    pointsLeft = Math.max(0, pointsLeft - points.length);
  });
}

function judgePoints(points: unknown[], base: string, errors: ErrorList): void {
  const isPoint = validator(quick, 'point');
  points.forEach((point, index) => {
    if (!isPoint(point)) judge('point', boundWork(point), `${base}/${index}`, errors);
  });
}

function tooManySeries(count: number): string {
  return `a dataset has at most ${MOST_SERIES} series; this one has ${withThousands(count)}`;
}

/** The sentence for a dataset with more points than are taken. */
export function tooManyPoints(count: number): string {
  return `a dataset has at most ${withThousands(MOST_POINTS)} points; here are ${withThousands(count)}`;
}

/** Adds what is wrong with one piece, one error a place. */
function judge(piece: Piece, value: unknown, base: string, errors: ErrorList, except?: string): void {
  const validate = validator(thorough, piece);
  if (errors.hasCountedEnough() || validate(value)) return;
  const places = new Map<string, ErrorObject>();
  for (const error of validate.errors ?? []) {
    const pointer = placeOfSchemaError(error, base);
    if (pointer !== except && !isRepetition(error) && !places.has(pointer)) places.set(pointer, error);
  }
  for (const [pointer, error] of places)
    if (!hangsOnUnit(pointer, places)) errors.add(pointer, () => explainSchemaError(error, base, pointer));
}

/** Complaints that only repeat others: of a key of a map (also told as `propertyNames`), of a choice. */
function isRepetition(error: ErrorObject): boolean {
  return error.propertyName !== undefined || error.keyword === 'if';
}

/** Which orientation is right depends on the unit: where the unit is wrong, it alone is named. */
function hangsOnUnit(pointer: string, places: Map<string, ErrorObject>): boolean {
  return pointer.endsWith('/orientation') && places.has(`${pointer.slice(0, -'orientation'.length)}unit`);
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
