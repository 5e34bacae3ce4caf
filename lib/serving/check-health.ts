/** Whether the parts that the site stands on work. */
import { probeDatabase } from '@/db/queries/health';
import { probeComputation } from '@/lib/assessments/assessment-pool';
import { log } from '@/lib/log';
import type { Health, PartHealth } from '@/schemas/health';
import { probeObjects } from '@/storage/objects';

let underWay: Promise<Health> | undefined;

/** Asks each part for a sign of life. Callers at the same moment share one answer, so that asking cannot be overdone. */
export function checkHealth(): Promise<Health> {
  underWay ??= ask().finally(() => {
    underWay = undefined;
  });
  return underWay;
}

async function ask(): Promise<Health> {
  const [database, storage, computation] = await Promise.all([
    sign(probeDatabase(), 'the database'),
    sign(probeObjects(), 'the storage of files'),
    probeComputation(),
  ]);
  const degraded = [database, storage, computation].includes('unavailable');
  return { status: degraded ? 'degraded' : 'ok', database, storage, computation };
}

async function sign(probe: Promise<void>, part: string): Promise<PartHealth> {
  try {
    await probe;
    return 'ok';
  } catch (error) {
    log().error({ err: error }, `${part} does not answer`);
    return 'unavailable';
  }
}
