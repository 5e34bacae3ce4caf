/** Gives every page its content policy with a nonce of its own; Next reads the nonce from the request's header. */
import { randomBytes } from 'node:crypto';
import { type NextRequest, NextResponse } from 'next/server';
import { pagePolicy } from '@/lib/serving/security-headers';

/** The page's request and answer with the same content policy; the rest of the headers are the server's. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = randomBytes(16).toString('base64');
  const policy = pagePolicy(nonce, process.env.NODE_ENV === 'development');
  const headers = new Headers(request.headers);
  headers.set('Content-Security-Policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  return response;
}

export const config = {
  // Not the API: Next would hold its bodies in memory on the way through here. Not static files: they need no nonce.
  matcher: ['/((?!api/|api$|_next/static/).*)'],
};
