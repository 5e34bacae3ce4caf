import { expectTypeOf, it } from 'vitest';
import type { z } from 'zod';
import type { FreeParameter } from '@/lib/engine/free-parameters';
import type { RefitResult } from '@/lib/engine/refit';
import type { freeListSchema, refitAnswerSchema } from '@/schemas/refit';

it('what a refit takes and answers is what the engine takes and gives', () => {
  expectTypeOf<z.infer<typeof refitAnswerSchema>>().toEqualTypeOf<RefitResult>();
  expectTypeOf<z.infer<typeof freeListSchema>[number]>().toEqualTypeOf<FreeParameter>();
});
