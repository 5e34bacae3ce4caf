import { useId } from 'react';

interface UnitChoice {
  value: string;
  label: string;
}

interface InlineQuantityProps {
  /** what the number is, for those who do not see the row */
  name: string;
  value: string;
  u?: string;
  unit?: string;
  units?: readonly UnitChoice[];
  error?: string;
  disabled?: boolean;
  onValue: (text: string) => void;
  onU?: (text: string) => void;
  onUnit?: (unit: string) => void;
}

const INPUT =
  'figures min-h-7 min-w-0 border-field border-b bg-transparent hover:border-ink aria-invalid:border-off aria-invalid:border-b-2 disabled:text-soft';

/** value ± u unit, typed in one line. */
export function InlineQuantity(props: InlineQuantityProps) {
  const { name, value, u, unit, units, error, disabled, onValue, onU, onUnit } = props;
  const id = useId();
  return (
    <div>
      <div className="flex flex-wrap items-baseline gap-1.5">
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          aria-label={name}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? id : undefined}
          disabled={disabled}
          value={value}
          onChange={({ target }) => onValue(target.value)}
          className={`${INPUT} w-16 font-semibold`}
        />
        {onU ? (
          <>
            <span className="text-soft">±</span>
            <input
              type="text"
              inputMode="decimal"
              autoComplete="off"
              aria-label={`standard uncertainty of ${name}`}
              disabled={disabled}
              value={u ?? ''}
              onChange={({ target }) => onU(target.value)}
              className={`${INPUT} w-12`}
            />
          </>
        ) : null}
        {units && onUnit ? (
          <select
            aria-label={`unit of ${name}`}
            disabled={disabled}
            value={unit}
            onChange={({ target }) => onUnit(target.value)}
            className={`${INPUT} grow basis-16`}
          >
            {units.map((choice) => (
              <option key={choice.value} value={choice.value} className="bg-ground text-ink">
                {choice.label}
              </option>
            ))}
          </select>
        ) : null}
      </div>
      {error ? (
        <p id={id} className="mt-0.5 text-off text-xs">
          {error}
        </p>
      ) : null}
    </div>
  );
}
