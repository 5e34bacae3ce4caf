import schema from '@/schemas/dataset-1.schema.json';
import { listWords } from './describe-value';

/** What the sentences of errors read of a subschema. */
export interface PropertySchema {
  $ref?: string;
  type?: string;
  enum?: unknown[];
  const?: unknown;
  description?: string;
  examples?: unknown[];
  properties?: Record<string, PropertySchema>;
  required?: string[];
  else?: PropertySchema;
}

const DEFINITIONS = schema.$defs as Record<string, unknown>;

/** A subschema with its references followed; of a choice, the usual branch. */
export function resolveReference(property: PropertySchema | undefined): PropertySchema {
  if (property?.$ref !== undefined) {
    const name = property.$ref.slice('#/$defs/'.length);
    return resolveReference(DEFINITIONS[name] as PropertySchema | undefined);
  }
  return property?.else?.$ref === undefined ? (property ?? {}) : resolveReference(property.else);
}

/** What a subschema takes, in words: `a number, such as 0.42`, `kT, kJ/mol, kcal/mol or meV`. */
export function describeAllowed(property: PropertySchema): string {
  const { type, examples, required, enum: words, const: word } = property;
  if (words !== undefined)
    return words.length > 20 ? 'one of the listed terms' : listWords(words.map(String));
  if (word !== undefined) return String(word);
  const example = examples?.[0];
  const suchAs =
    example === undefined
      ? ''
      : `, such as ${typeof example === 'string' ? `“${example}”` : JSON.stringify(example)}`;
  if (type === 'object')
    return `an object with ${required === undefined ? 'a number for each id' : listWords(required, 'and')}`;
  return `${TYPE_NAMES[type ?? ''] ?? 'stated'}${suchAs}`;
}

const TYPE_NAMES: Record<string, string> = {
  array: 'a list',
  integer: 'a whole number',
  null: 'null',
  number: 'a number',
  string: 'text',
};

/** Every property name that the schema knows anywhere. */
export const KNOWN_PROPERTIES: ReadonlySet<string> = new Set(collectNames(schema));

function collectNames(node: unknown): string[] {
  if (typeof node !== 'object' || node === null) return [];
  const own = 'properties' in node ? Object.keys(node.properties as object) : [];
  return [...own, ...Object.values(node).flatMap(collectNames)];
}
