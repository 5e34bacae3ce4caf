/** Whether the parts that the site stands on work. */
import { probeDatabase } from '@/db/queries/health';
import { probeComputation } from '@/lib/assessments/assessment-pool';
import { log } from '@/lib/log';
import type { Health, PartHealth } from '@/schemas/health';

let underWay: Promise<Health> | undefined;

/** Asks each part for a sign of life. Callers at the same moment share one answer, so that asking cannot be overdone. */
export function checkHealth(): Promise<Health> {
  underWay ??= ask().finally(() => {
    underWay = undefined;
  });
  return underWay;
}

async function ask(): Promise<Health> {
  const [database, computation] = await Promise.all([databaseHealth(), probeComputation()]);
  const degraded = database === 'unavailable' || computation === 'unavailable';
  return { status: degraded ? 'degraded' : 'ok', database, computation };
}

async function databaseHealth(): Promise<PartHealth> {
  try {
    await probeDatabase();
    return 'ok';
  } catch (error) {
    log().error({ err: error }, 'the database does not answer');
    return 'unavailable';
  }
}
