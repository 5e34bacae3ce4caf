/** When a calendar day begins somewhere. */

/**
 * The first moment of a day in a time zone, as Unix time in ms. Where clocks skip midnight the day begins an hour
 * later by its own clock.
 *
 * @param day such as `2027-03-01`
 * @param zone an IANA time zone
 */
export function startOfDay(day: string, zone: string): number {
  const asUtc = Date.parse(`${day}T00:00:00Z`);
  // The offset is that of the moment itself, which is what is looked for: that of a near one, then a better one.
  const near = asUtc - offsetAt(asUtc, zone);
  const nearer = asUtc - offsetAt(near, zone);
  const moments = [near, nearer].sort((a, b) => a - b);
  return moments.find((at) => clockAt(at, zone).startsWith(day)) ?? nearer;
}

/** How far clocks there are ahead of UTC at a moment, ms. */
function offsetAt(at: number, zone: string): number {
  return Date.parse(`${clockAt(at, zone)}Z`) - at;
}

/** What clocks there show, `2027-03-01T00:00:00`. */
function clockAt(at: number, zone: string): string {
  // Sweden writes days as ISO 8601 does.
  const clock = new Intl.DateTimeFormat('sv-SE', { timeZone: zone, dateStyle: 'short', timeStyle: 'medium' });
  return clock.format(at).replace(' ', 'T');
}
