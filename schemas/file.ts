/** An original file of a deposit as the API describes it. */
import { z } from 'zod';

export const fileSchema = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    size: z.int().meta({ description: 'Bytes' }),
    sha256: z.string().meta({ description: 'Hex' }),
    mediaType: z.string().meta({ description: 'Judged by its content' }),
    uploadedAt: z.iso.datetime(),
    links: z.strictObject({ self: z.string() }),
  })
  .meta({ id: 'File' });

export const fileListSchema = z.strictObject({ files: z.array(fileSchema) }).meta({ id: 'FileList' });

export type FileAnswer = z.infer<typeof fileSchema>;
