/**
 * Writes `dataset-1.generated.ts`, the TypeScript types of a dataset document, from the JSON Schema.
 * Run: `npx tsx schemas/generate-types.ts`. A test holds the committed file against a fresh one.
 */
import { readFile, writeFile } from 'node:fs/promises';
import { pathToFileURL } from 'node:url';
import { compile, type JSONSchema } from 'json-schema-to-typescript';

const SCHEMA = new URL('./dataset-1.schema.json', import.meta.url);
const OUTPUT = new URL('./dataset-1.generated.ts', import.meta.url);

const BANNER = `/**
 * Types of a dataset document. Generated from dataset-1.schema.json: change that, then run
 * \`npx tsx schemas/generate-types.ts\`.
 */`;

/** Schema keywords that say something about values which TypeScript's types cannot. */
const UNTYPED = new Set(['not', 'if', 'then', 'else', 'propertyNames', 'examples', 'pattern']);

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/**
 * A choice between two referred schemas (`if`, `then: $ref`, `else: $ref`) becomes a union, which the
 * compiler knows; a reference loses its own description, which would make a second type of it; keywords
 * without a counterpart in types are left out.
 */
function keepWhatTypesCanSay(node: Json): Json {
  if (Array.isArray(node)) return node.map(keepWhatTypesCanSay);
  if (node === null || typeof node !== 'object') return node;
  if (node.$ref !== undefined) return { $ref: node.$ref };
  const { then: ifSo, else: otherwise } = node;
  const kept = Object.entries(node).filter(([key]) => !UNTYPED.has(key));
  const result = Object.fromEntries(kept.map(([key, value]) => [key, keepWhatTypesCanSay(value)]));
  return isChoice(ifSo) && isChoice(otherwise) ? { ...result, anyOf: [ifSo, otherwise] } : result;
}

function isChoice(node: Json | undefined): node is { [key: string]: Json } {
  return typeof node === 'object' && node !== null && ('$ref' in node || 'type' in node);
}

/** The source text of `dataset-1.generated.ts` as the schema on disk asks for it. */
export async function generateTypes(): Promise<string> {
  const schema = keepWhatTypesCanSay(JSON.parse(await readFile(SCHEMA, 'utf8'))) as JSONSchema;
  return compile({ ...schema, title: 'DatasetDocument' }, 'DatasetDocument', {
    additionalProperties: false,
    bannerComment: BANNER,
    ignoreMinAndMaxItems: true,
    style: { printWidth: 110, singleQuote: true, trailingComma: 'all' },
  });
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  await writeFile(OUTPUT, await generateTypes());
}
