/** The handler of each kind of job. */
import { refitJob } from '@/lib/refits/refit-job';
import type { JobHandlers } from './job-kinds';

export const JOB_HANDLERS: JobHandlers = { refit: refitJob };
