/** What `/api/v1/health` answers. */
import { z } from 'zod';

/** `busy`: working, with a queue in front of it. */
export const partHealthSchema = z.enum(['ok', 'busy', 'unavailable']);

export const healthSchema = z
  .strictObject({
    status: z.enum(['ok', 'degraded']),
    database: partHealthSchema,
    storage: partHealthSchema,
    computation: partHealthSchema,
  })
  .meta({ id: 'Health' });

export type Health = z.infer<typeof healthSchema>;
export type PartHealth = z.infer<typeof partHealthSchema>;
