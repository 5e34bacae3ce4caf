import type { PlotData } from '@/components/plots/plot-data';

interface CollapseSwitchProps {
  data: PlotData;
  /** id of the ligand that points stand by; null: by energy */
  byLigand: string | null;
  onChange: (ligand: string | null) => void;
}

/** Turns the collapse into the separate responses and back. */
export function CollapseSwitch({ data, byLigand, onChange }: CollapseSwitchProps) {
  const options = [
    { id: null, label: 'by energy' },
    ...data.document.ligands.map(({ id, name }) => ({ id, label: `by ${name} concentration` })),
  ];
  return (
    <fieldset className="flex flex-wrap gap-x-5 border-hairline border-b px-2">
      <legend className="sr-only">Points ordered</legend>
      {options.map(({ id, label }) => (
        <label
          key={id ?? ''}
          className="inline-flex min-h-9 items-center border-transparent border-b-2 not-has-checked:print:hidden text-sm text-soft hover:text-ink has-checked:border-ink has-checked:font-semibold has-checked:text-ink has-focus-visible:outline-2 has-focus-visible:outline-act"
        >
          <input
            type="radio"
            name="by"
            className="sr-only"
            checked={byLigand === id}
            onChange={() => onChange(id)}
          />
          {label}
        </label>
      ))}
    </fieldset>
  );
}
