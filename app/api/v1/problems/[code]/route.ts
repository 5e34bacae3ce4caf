/** `GET /api/v1/problems/{code}`: what the `type` of a problem means. */
import { ERRORS, isErrorCode, problemResponse } from '@/lib/errors';
import { answering, methodNotAllowed, optionsOf, unchangingResponse } from '@/lib/serving/answer-api';

export const GET = answering((request) => {
  const { pathname } = new URL(request.url);
  const code = pathname.slice(pathname.lastIndexOf('/') + 1);
  if (!isErrorCode(code)) return problemResponse({ code: 'not-found' });
  const kind = { type: `/api/v1/problems/${code}`, ...ERRORS[code] };
  return unchangingResponse(request, JSON.stringify(kind), 'application/json');
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
