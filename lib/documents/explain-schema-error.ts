import type { ErrorObject } from 'ajv';
import { closestWord } from './closest-word';
import { describeValue, listWords, quote, withThousands } from './describe-value';
import { pointerTo } from './json-pointer';
import { namePlace } from './name-place';
import { describeAllowed, type PropertySchema, resolveReference } from './read-schema';

/**
 * The place that a complaint of the schema validator is about: where a property is missing or unknown, that
 * property's own.
 *
 * @param base pointer of the value that was validated
 */
export function placeOfSchemaError({ instancePath, params }: ErrorObject, base: string): string {
  const member = params.missingProperty ?? params.additionalProperty ?? params.propertyName;
  return member === undefined ? base + instancePath : pointerTo(base + instancePath, member);
}

/**
 * What a complaint of the schema validator means, in the words of the document.
 *
 * @param error as ajv gives it with `verbose`
 * @param base pointer of the value that was validated
 * @param pointer what `placeOfSchemaError` says
 */
export function explainSchemaError(error: ErrorObject, base: string, pointer: string): string {
  const explain = EXPLANATIONS[error.keyword];
  const name = namePlace(pointer);
  if (explain === undefined) return `${name} is not as the schema asks`;
  return explain(error, name, describeValue(error.data), base + error.instancePath);
}

/** @param place pointer of the value complained of: for a missing or unknown property, what it is missing from */
type Explanation = (error: ErrorObject, name: string, found: string, place: string) => string;

const EXPLANATIONS: Record<string, Explanation> = {
  type: ({ parentSchema, data }, name, found, place) => {
    if (data === Number.POSITIVE_INFINITY || data === Number.NEGATIVE_INFINITY)
      return `${name} must be a finite number; found ${found}`;
    const orNull = /\/binding\/\d+\/(inactive|active)$/.test(place);
    return `${name} must be ${describeAllowed(parentSchema as PropertySchema)}${orNull ? ', or null' : ''}; found ${found}`;
  },
  enum: explainChoice,
  const: explainChoice,
  minimum: ({ params }, name, found) => `${name} must be ${params.limit} or more; found ${found}`,
  maximum: ({ params }, name, found) => `${name} must be at most ${params.limit}; found ${found}`,
  exclusiveMinimum: ({ params }, name, found) =>
    `${name} must be greater than ${params.limit}; found ${found}`,
  minLength: (_, name) => `${name} must not be empty`,
  maxLength: ({ params }, name) => `${name} may have at most ${withThousands(params.limit)} characters`,
  minItems: ({ params }, name) =>
    name === 'replicates'
      ? 'replicates must hold two or more measurements; a single one is stated as activity'
      : `${name} must hold at least ${params.limit}`,
  maxItems: ({ params }, name) =>
    `${name} may hold at most ${withThousands(params.limit)}; there are more here`,
  maxProperties: ({ params }, name) => `${name} may hold at most ${params.limit}; there are more here`,
  pattern: explainPattern,
  not: (_, name, found) =>
    name === 'an entry of binding'
      ? 'inactive and active must not both be null: a ligand that binds neither state is left out of binding'
      : `${name} must not be a word that programs reserve; found ${found}`,
  required: explainMissing,
  additionalProperties: explainUnknown,
  propertyNames: explainKey,
  'false schema': explainForbidden,
};

function explainChoice({ parentSchema, data }: ErrorObject, name: string, found: string): string {
  const allowed = allowedWords(parentSchema as PropertySchema, name);
  const near = typeof data === 'string' ? closestWord(data, allowed) : null;
  const hint = near === null ? '' : `; did you mean ${quote(near)}?`;
  if (name.startsWith('orientation of')) return `${explainOrientation(allowed, name)}; found ${found}${hint}`;
  const choice =
    allowed.length > 20 ? `a DataCite relation type, such as IsSupplementTo` : `${listWords(allowed)}`;
  return `${name} must be ${choice}; found ${found}${hint}`;
}

/** A gap may also be a ratio, though the energy branch of the schema knows only energies. */
function allowedWords(schema: PropertySchema, name: string): string[] {
  const words = (schema.enum ?? [schema.const]).map(String);
  const takesRatio = name === 'unit of gap' || name === 'unit of gapPerSite';
  return takesRatio && !words.includes('ratio') ? [...words, 'ratio'] : words;
}

function explainOrientation(allowed: string[], name: string): string {
  const statement = name.slice('orientation of '.length);
  const unit = allowed.includes('inactive-over-active') ? 'with unit ratio' : 'in a unit of energy';
  return `${statement} ${unit} takes the orientation ${listWords(allowed)}`;
}

function explainPattern({ parentSchema }: ErrorObject, name: string, found: string): string {
  const { description = '', examples = [] } = parentSchema as PropertySchema;
  const rule = name === 'orcid' || name === 'system' || name === 'identifier' ? description : ID_RULE;
  return `${name} must be like ${quote(String(examples[0]))}; found ${found}. ${rule}`;
}

const ID_RULE = 'An id holds letters, digits, dot, underscore and hyphen, beginning with a letter or digit.';

function explainMissing(error: ErrorObject, _name: string, _found: string, place: string): string {
  const missing: string = error.params.missingProperty;
  if (missing === 'activity')
    return 'a point needs activity, such as 0.42, or replicates, such as [0.41, 0.44]';
  if (missing === 'fittedCount')
    return 'with origin fitted-here, fittedCount must say how many parameters were fitted to these points';
  const schema = resolveReference((error.parentSchema as PropertySchema).properties?.[missing]);
  return `${namePlace(place)} needs ${missing}: ${describeAllowed(schema)}`;
}

function explainUnknown(error: ErrorObject, _name: string, _found: string, place: string): string {
  const unknown: string = error.params.additionalProperty;
  const known = Object.keys((error.parentSchema as PropertySchema).properties ?? {});
  const near = closestWord(unknown, known);
  const hint =
    near === null ? `${namePlace(place)} takes ${listWords(known, 'and')}` : `did you mean “${near}”?`;
  return `unknown property ${quote(unknown)}; ${hint}`;
}

function explainKey(error: ErrorObject, _name: string, _found: string, place: string): string {
  const kind = place.endsWith('/ligands') ? 'ligand' : 'modulator';
  return `${quote(error.params.propertyName)} cannot be the id of a ${kind}. ${ID_RULE}`;
}

function explainForbidden(_: ErrorObject, name: string): string {
  if (name === 'fittedCount') return 'fittedCount is stated only with origin fitted-here';
  if (name === 'u') return 'u belongs to activity; the uncertainty of replicates comes from their spread';
  return 'a point takes activity or replicates, not both';
}
