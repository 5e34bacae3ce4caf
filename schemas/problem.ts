/** Problem details of the API (RFC 9457, `application/problem+json`). */
import { z } from 'zod';

export const documentErrorSchema = z
  .strictObject({
    pointer: z
      .string()
      .meta({ description: 'JSON Pointer (RFC 6901) into the document', example: '/series/0/points/3/u' }),
    detail: z.string().meta({ description: 'What would be right' }),
  })
  .meta({ id: 'DocumentError' });

export const problemSchema = z
  .strictObject({
    type: z.string().meta({
      description: 'What kind of problem this is; a path on this server that says more',
      example: '/api/v1/problems/invalid-document',
    }),
    title: z.string(),
    status: z.int().min(400).max(599),
    detail: z.string(),
    line: z.int().min(1).optional().meta({ description: 'Malformed JSON: line of the first error, from 1' }),
    column: z
      .int()
      .min(1)
      .optional()
      .meta({ description: 'Malformed JSON: column of the first error, from 1' }),
    errors: z
      .array(documentErrorSchema)
      .optional()
      .meta({ description: 'Invalid document: all that is wrong' }),
  })
  .meta({ id: 'Problem' });

export type Problem = z.infer<typeof problemSchema>;

/** One kind of problem, as `/api/v1/problems/{code}` explains it. */
export const problemKindSchema = z
  .strictObject({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    meaning: z.string(),
  })
  .meta({ id: 'ProblemKind' });
