/** Parts of the API's description that many calls share. */
import type { OpenAPIRegistry } from '@asteasolutions/zod-to-openapi';
import { ERRORS, type ErrorCode } from '@/lib/errors';
import { type problemKindSchema, problemSchema } from '@/schemas/problem';

export type Registry = OpenAPIRegistry;
type RouteConfig = Parameters<Registry['registerPath']>[0];
export type Responses = RouteConfig['responses'];
export type ComponentSchema = Parameters<typeof OpenAPIRegistry.prototype.registerComponent<'schemas'>>[2];

/** Answers of a read that only changes with its content. */
export function unchanging(mediaType: string, schema: typeof problemKindSchema | ComponentSchema): Responses {
  return {
    200: {
      description: 'As of this version',
      headers: { ETag: text('Changes only with the content') },
      content: { [mediaType]: { schema } },
    },
    304: { description: 'Not changed since the ETag in If-None-Match' },
  };
}

/** One answer per status, naming every kind of problem that it can be. */
export function problems(...codes: ErrorCode[]): Responses {
  const statuses = [...new Set(codes.map((code) => ERRORS[code].status))];
  return Object.fromEntries(
    statuses.map((status) => {
      const kinds = codes.filter((code) => ERRORS[code].status === status);
      const waits = status === 429 || status === 503;
      const answer = {
        description: kinds.map((code) => `\`${code}\`: ${ERRORS[code].meaning}`).join(' '),
        ...(waits ? { headers: { 'Retry-After': text('Seconds to wait') } } : {}),
        content: { 'application/problem+json': { schema: problemSchema } },
      };
      return [status, answer] as const;
    }),
  );
}

/** A header that is a text. */
export function text(description: string) {
  return { description, schema: { type: 'string' } } as const;
}

/** The headers that tell a caller its limits. */
export const LIMIT_HEADERS = {
  RateLimit: text('What is left of each limit (draft-ietf-httpapi-ratelimit-headers-10)'),
  'RateLimit-Policy': text(
    'The limits of one address: calls and, of assessments, points a minute; calls at a time',
  ),
};
