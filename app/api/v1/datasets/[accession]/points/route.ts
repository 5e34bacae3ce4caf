/** `GET /api/v1/datasets/{accession}/points`: the computed points as JSON, CSV or one JSON object a line. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { choosePointFormat } from '@/lib/datasets/choose-format';
import { loadPoints } from '@/lib/datasets/load-points';
import { POINT_FORMATS, writePoints } from '@/lib/datasets/write-points';
import { problemResponse } from '@/lib/errors';
import { answering, methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { attachment, collectionResponse } from '@/lib/serving/answer-collection';

export const GET = answering(async (request, { params }: RouteContext<'accession'>) => {
  const { accession } = await params;
  const chosen = choosePointFormat(new URL(request.url).searchParams, request.headers.get('accept'));
  if (!chosen.ok) return problemResponse(chosen.failure, { Vary: 'Accept' });
  const { format } = chosen;
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `points ${accession} ${format}`, async () => {
    const outcome = await loadPoints(actor, accession);
    if (!outcome.ok) return outcome;
    const { loaded } = outcome;
    return {
      text: writePoints(loaded, format),
      contentType: POINT_FORMATS[format].contentType,
      headers: attachment(`${loaded.accession}-points.${format}`),
    };
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
