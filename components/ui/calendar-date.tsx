const FORMAT = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
});

/** A day of the calendar (UTC) from Unix time in ms. */
export function CalendarDate({ at }: { at: number }) {
  return (
    <time dateTime={new Date(at).toISOString()} className="figures whitespace-nowrap">
      {FORMAT.format(at)}
    </time>
  );
}
