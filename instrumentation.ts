/** Next calls this where a page or route handler throws. */
import type { Instrumentation } from 'next';

export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  // Next compiles this file for its edge runtime as well, where the logger cannot be.
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { log } = await import('@/lib/log');
  const path = request.path.replace(/[?#].*$/, '');
  log().error({ err: error, method: request.method, path, route: context.routePath }, 'a page failed');
};
