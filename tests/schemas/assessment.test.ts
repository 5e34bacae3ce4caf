import { expect, expectTypeOf, it } from 'vitest';
import type { z } from 'zod';
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import type { Assessment } from '@/lib/engine/assessment';
import { assessmentSchema } from '@/schemas/assessment';
import { exampleDocument } from '@/tests/support/example-document';

/** The same type with every intersection written out, since `A & B` is no plain object to `toEqualTypeOf`. */
type WrittenOut<T> = T extends object ? { [K in keyof T]: WrittenOut<T[K]> } : T;
type OfSchema = WrittenOut<z.infer<typeof assessmentSchema>>;
type OfEngine = WrittenOut<Assessment>;

it('the schema of the assessment and the type of the engine are the same', () => {
  expectTypeOf<OfSchema>().toEqualTypeOf<OfEngine>();
  expectTypeOf<OfEngine>().toEqualTypeOf<OfSchema>();
});

it('what the engine computes fits the schema', () => {
  const parsed = parseDocument(JSON.stringify(exampleDocument({ series: 3, pointsPerSeries: 8 })));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed));
  const assessment: unknown = JSON.parse(JSON.stringify(assess(parsed.document)));
  expect(assessmentSchema.parse(assessment)).toEqual(assessment);
});
