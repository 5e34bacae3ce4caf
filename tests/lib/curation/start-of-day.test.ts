import { expect, it } from 'vitest';
import { startOfDay } from '@/lib/curation/start-of-day';

// Offsets of the IANA time zone database, written out by hand (common knowledge of the zones).
it.each([
  ['2027-03-01', 'UTC', '2027-03-01T00:00:00Z'],
  ['2027-03-01', 'Europe/Oslo', '2027-02-28T23:00:00Z'],
  ['2027-07-01', 'Europe/Oslo', '2027-06-30T22:00:00Z'],
  // The clocks of Oslo change in the night of this day, after midnight.
  ['2027-03-28', 'Europe/Oslo', '2027-03-27T23:00:00Z'],
  ['2027-03-29', 'Europe/Oslo', '2027-03-28T22:00:00Z'],
  ['2027-03-01', 'America/Los_Angeles', '2027-03-01T08:00:00Z'],
  ['2027-03-01', 'Asia/Kathmandu', '2027-02-28T18:15:00Z'],
  ['2027-03-01', 'Pacific/Kiritimati', '2027-02-28T10:00:00Z'],
  // The clocks of São Paulo went from 23:59:59 to 01:00 that night.
  ['2018-11-04', 'America/Sao_Paulo', '2018-11-04T03:00:00Z'],
])('%s in %s begins at %s', (day, zone, begins) => {
  expect(new Date(startOfDay(day, zone)).toISOString()).toBe(begins.replace('Z', '.000Z'));
});
