/** The chore that removes jobs that were given up long ago. */
import { deleteGivenUpJobs } from '@/db/queries/jobs';
import { GIVEN_UP_KEPT_MS } from './lease';

/** Removes the jobs whose error nobody has looked at in a month. */
export async function forgetGivenUpJobs(): Promise<void> {
  await deleteGivenUpJobs(Date.now() - GIVEN_UP_KEPT_MS);
}
