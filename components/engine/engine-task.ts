/** What pages ask of the engine in the browser, and what comes back. */
import type { Assessment } from '@/lib/engine/assessment';
import type { FreeParameter } from '@/lib/engine/free-parameters';
import type { RefitResult } from '@/lib/engine/refit';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { Reading } from './reading';

export interface EngineTasks {
  /** a document re-read and assessed */
  try: {
    given: { document: DatasetDocument; reading: Reading };
    answer: { document: DatasetDocument; assessment: Assessment };
  };
  refit: {
    given: { document: DatasetDocument; free: readonly FreeParameter[] };
    answer: RefitResult;
  };
}

export type EngineTask = {
  [Kind in keyof EngineTasks]: { kind: Kind } & EngineTasks[Kind]['given'];
}[keyof EngineTasks];

export type EngineMessage =
  /** share done, 0 to 1 */
  | { kind: 'progress'; share: number }
  | { kind: 'done'; answer: EngineTasks[keyof EngineTasks]['answer'] }
  | { kind: 'failed'; detail: string };
