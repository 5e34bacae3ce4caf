/** `GET /api/v1/health`: 200 where everything works, 503 where a part does not; which part, and no more than that. */
import { allowing, answering, methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { checkHealth } from '@/lib/serving/check-health';

export const GET = answering(
  allowing('read-health', async () => {
    const health = await checkHealth();
    const headers = { 'Cache-Control': 'no-store' };
    return Response.json(health, { status: health.status === 'ok' ? 200 : 503, headers });
  }),
);

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
