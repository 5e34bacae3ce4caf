/** Every address under /api that is not another route's: not found, as a problem. */
import { problemResponse } from '@/lib/errors';

const notFound = () => problemResponse({ code: 'not-found' });

export {
  notFound as DELETE,
  notFound as GET,
  notFound as HEAD,
  notFound as OPTIONS,
  notFound as PATCH,
  notFound as POST,
  notFound as PUT,
};
