import { KNOWN_PROPERTIES } from './read-schema';

/** More than any list in a valid document holds, series and points excepted. */
const LONGEST_LIST = 600;
/** More than any object in a valid document has members. */
const MOST_MEMBERS = 200;
/** Deeper than any place that the schema knows. */
const DEEPEST = 12;

/**
 * A copy in which overlong lists and objects are cut to a length that is still too long, so that judging a
 * hostile document costs no more than judging a bad one. Members that the schema knows are never cut away.
 *
 * @param instead members of the outermost object that are replaced and not looked into
 */
export function boundWork(value: unknown, instead: Record<string, unknown> = {}, depth = 0): unknown {
  if (typeof value !== 'object' || value === null || depth > DEEPEST) return value;
  if (Array.isArray(value))
    return value.slice(0, LONGEST_LIST).map((entry) => boundWork(entry, {}, depth + 1));
  const copy = fewMembers(value, instead);
  for (const [key, member] of Object.entries(copy)) {
    if (!Object.hasOwn(instead, key)) define(copy, key, boundWork(member, {}, depth + 1));
  }
  return copy;
}

/** A shallow copy of an object with those members that the schema knows and the first few of the others. */
export function fewMembers(value: object, instead: Record<string, unknown> = {}): Record<string, unknown> {
  const source = value as Record<string, unknown>;
  const copy: Record<string, unknown> = {};
  let count = 0;
  for (const key in source) {
    if (!Object.hasOwn(source, key)) continue;
    count += 1;
    if (count > MOST_MEMBERS) break;
    define(copy, key, source[key]);
  }
  if (count > MOST_MEMBERS)
    for (const key of KNOWN_PROPERTIES) if (Object.hasOwn(source, key)) copy[key] = source[key];
  return Object.assign(copy, instead);
}

/** Sets a member under any name; assigning to `__proto__` would set none. */
function define(target: Record<string, unknown>, key: string, value: unknown): void {
  if (key === '__proto__')
    Object.defineProperty(target, key, { value, enumerable: true, configurable: true, writable: true });
  else target[key] = value;
}
