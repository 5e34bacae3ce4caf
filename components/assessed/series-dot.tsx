const FILLS = [
  '',
  'fill-series-1',
  'fill-series-2',
  'fill-series-3',
  'fill-series-4',
  'fill-series-5',
  'fill-series-6',
];

/** The colour of a series beside its name; nothing where there are too many series for colours. */
export function SeriesDot({ colour }: { colour: number | null }) {
  if (colour === null) return null;
  return (
    <svg viewBox="0 0 10 10" aria-hidden="true" className="size-2.5 shrink-0 self-center">
      <circle cx={5} cy={5} r={4} strokeWidth={1} className={`stroke-ink ${FILLS[colour]}`} />
    </svg>
  );
}
