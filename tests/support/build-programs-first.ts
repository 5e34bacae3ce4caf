/** Unit tests of the assessment pool run the bundled worker: it is made anew before them. */
import { buildPrograms } from '@/lib/serving/build-programs';

export async function setup(): Promise<void> {
  await buildPrograms();
}
