const HOUR_MS = 3_600_000;

/** How long something has been waiting, in whole hours or days. */
export function ageWords(ageMs: number): string {
  const hours = Math.floor(ageMs / HOUR_MS);
  if (hours < 1) return 'less than an hour';
  if (hours < 48) return `${hours} ${hours === 1 ? 'hour' : 'hours'}`;
  return `${Math.floor(hours / 24)} days`;
}
