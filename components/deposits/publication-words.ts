/** The day of a publication to come, in words. */
import type { PublicationDay } from '@/schemas/deposit';

const FORMAT = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' });

/** `2027-03-01` as 1 March 2027. */
export function dayWords(day: string): string {
  return FORMAT.format(Date.parse(`${day}T00:00:00Z`));
}

/** The day, and whose midnight. */
export function publicationWords({ day, timeZone }: PublicationDay): string {
  return `${dayWords(day)}, at midnight (${timeZone.replaceAll('_', ' ')})`;
}
