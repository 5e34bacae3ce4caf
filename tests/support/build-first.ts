/** Integration and browser tests run what is built; it is built first where the sources changed. */
import { buildIfStale } from '@/lib/serving/build-all';

export async function setup(): Promise<void> {
  await buildIfStale();
}
