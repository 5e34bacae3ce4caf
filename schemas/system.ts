/** What the API says of systems: proteins with their ligands. */
import { z } from 'zod';
import { namedSchema, pointCountsSchema } from './dataset-answers';

export const systemSchema = z
  .strictObject({
    slug: z.string(),
    name: z.string(),
    protein: z.string(),
    ligands: z.array(z.string()),
    datasets: z.int(),
    counts: pointCountsSchema.meta({ description: 'Points of its published datasets' }),
    labs: z.array(
      namedSchema.extend({ datasets: z.int() }).meta({ id: 'SystemLab', description: 'Most datasets first' }),
    ),
  })
  .meta({ id: 'System' });

export const systemListSchema = z
  .strictObject({
    systems: z.array(systemSchema),
    next: z.string().nullable().meta({ description: 'Address of the next page; null on the last one' }),
  })
  .meta({ id: 'SystemList' });

export type SystemAnswer = z.infer<typeof systemSchema>;
export type SystemList = z.infer<typeof systemListSchema>;
