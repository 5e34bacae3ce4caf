/** Which kinds of jobs there are, what each is told, and what its handler is. */
import type { Transaction } from '@/db/client';

/** What a job of each kind is told; it is kept as JSON. */
export interface JobPayloads {
  /** a refit that takes longer than its call */
  refit: { refitId: string };
}

export type JobKind = keyof JobPayloads;

/** What a job writes at its end, in the transaction that ends it: either both are on the disk, or neither. */
export type Finish = (tx: Transaction) => Promise<void>;

/** Thrown by a handler that finds no room for the work now: the attempt does not count. */
export class NoRoom extends Error {}

/**
 * How a kind of job is done. A job may be begun more than once, where a process died over it or lost it, but only one
 * attempt ends it: what goes out beyond the database must bear being done twice.
 */
export interface JobHandler<K extends JobKind = JobKind> {
  /** after so many attempts it is given up */
  mostAttempts: number;
  /** Does the work. Where `signal` aborts, the job is no longer this process's: stop, and throw. */
  run: (payload: JobPayloads[K], signal: AbortSignal) => Promise<Finish>;
  /** done with each sign of life, so that what the job holds beside itself does not run out */
  onBeat?: (payload: JobPayloads[K]) => Promise<void>;
  /** what is written where the job is given up */
  giveUp?: (payload: JobPayloads[K]) => Finish;
}

export type JobHandlers = { [K in JobKind]: JobHandler<K> };
