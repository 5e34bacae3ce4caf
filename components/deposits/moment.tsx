const FORMAT = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
  timeZone: 'UTC',
});

/** A day and a time of it (UTC). */
export function Moment({ at }: { at: number | string }) {
  const date = new Date(at);
  return (
    <time dateTime={date.toISOString()} className="figures whitespace-nowrap">
      {FORMAT.format(date)} UTC
    </time>
  );
}
