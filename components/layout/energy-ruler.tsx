interface EnergyRulerProps {
  /** left and right edge, kT */
  from: number;
  to: number;
}

/** Whole energies inside a window, kT, thinned so that at most `most` remain. */
export function rulerTicks(from: number, to: number, most = 40): number[] {
  const step = [1, 2, 5, 10, 20, 50, 100].find((size) => (to - from) / size <= most) ?? 200;
  const first = Math.ceil(from / step) * step;
  const count = Math.floor((to - first) / step) + 1;
  return Array.from({ length: Math.max(0, count) }, (_, i) => first + i * step);
}

/** The free-energy axis as a ruler, in kT, drawn across whatever width it is given. */
export function EnergyRuler({ from, to }: EnergyRulerProps) {
  const place = (energy: number) => `${((energy - from) / (to - from)) * 100}%`;
  const ticks = rulerTicks(from, to).filter((energy) => energy > from && energy < to);
  return (
    <svg
      className="block h-8 w-full text-2xs"
      role="img"
      aria-label={`Free-energy axis from ${from} to ${to} kT`}
    >
      {ticks.map((energy) => {
        const labelled = energy % 2 === 0;
        return (
          <g key={energy}>
            <line
              x1={place(energy)}
              x2={place(energy)}
              y1={0}
              y2={labelled ? 7 : 4}
              className="stroke-field"
            />
            {labelled ? (
              <text x={place(energy)} y={22} textAnchor="middle" className="figures fill-soft">
                {String(energy).replace('-', '\u2212')}
              </text>
            ) : null}
          </g>
        );
      })}
      <text x={9} y={22} className="fill-ink font-semibold">
        kT
      </text>
    </svg>
  );
}
