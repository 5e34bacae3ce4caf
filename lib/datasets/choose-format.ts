/** Which form of an answer a caller wants: `?format=` where it is given, else what `Accept` asks for (RFC 9110, 12.5.1). */
import { failed, type Outcome } from '@/lib/errors';
import { POINT_FORMATS, type PointFormat } from './write-points';

const FORMATS = Object.keys(POINT_FORMATS) as PointFormat[];

/** The form in which points are sent: `bad-parameter` for a format that there is none of, `not-acceptable` for the header. */
export function choosePointFormat(
  parameters: URLSearchParams,
  accept: string | null,
): Outcome<{ format: PointFormat }> {
  for (const name of parameters.keys())
    if (name !== 'format')
      return failed('bad-parameter', `There is no parameter “${name.slice(0, 50)}” here.`);
  const stated = parameters.getAll('format');
  if (stated.length > 0) {
    const format = FORMATS.find((one) => one === stated[0]);
    return format && stated.length === 1
      ? { ok: true, format }
      : failed('bad-parameter', `The parameter format must be one of ${FORMATS.join(', ')}.`);
  }
  const mediaTypes = FORMATS.map((format) => POINT_FORMATS[format].mediaType);
  const chosen = chooseMediaType(accept, mediaTypes);
  const format = FORMATS.find((one) => POINT_FORMATS[one].mediaType === chosen);
  return format ? { ok: true, format } : failed('not-acceptable', `Accept one of ${mediaTypes.join(', ')}.`);
}

interface Range {
  type: string;
  quality: number;
  /** 2 for `text/csv`, 1 for `text/*`, 0 for any */
  precision: number;
}

/**
 * The media type that a caller likes best.
 *
 * @param accept the header, or null: everything is welcome
 * @param offered what there is, the usual one first
 * @returns null where none is acceptable
 */
export function chooseMediaType<T extends string>(accept: string | null, offered: readonly T[]): T | null {
  if (accept === null || accept.trim() === '') return offered[0] ?? null;
  const ranges = accept.split(',').map(readRange);
  let best: { type: T; quality: number } | null = null;
  for (const type of offered) {
    const quality = qualityOf(type, ranges);
    if (quality > (best?.quality ?? 0)) best = { type, quality };
  }
  return best?.type ?? null;
}

function readRange(text: string): Range {
  const [type = '', ...parameters] = text.split(';').map((part) => part.trim().toLowerCase());
  const stated = parameters
    .find((parameter) => /^q\s*=/.test(parameter))
    ?.split('=')[1]
    ?.trim();
  const quality =
    stated === undefined ? 1 : /^(0(\.\d{0,3})?|1(\.0{0,3})?)$/.test(stated) ? Number(stated) : 0;
  const precision = type === '*/*' ? 0 : type.endsWith('/*') ? 1 : 2;
  return { type, quality, precision };
}

/** The quality of the most precise range that a type falls under; 0 where it falls under none. */
function qualityOf(type: string, ranges: Range[]): number {
  const fitting = ranges.filter(
    (range) =>
      range.type === type ||
      range.type === '*/*' ||
      (range.precision === 1 && type.startsWith(range.type.slice(0, -1))),
  );
  fitting.sort((a, b) => b.precision - a.precision);
  return fitting[0]?.quality ?? 0;
}
