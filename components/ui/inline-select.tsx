interface InlineSelectProps {
  name: string;
  value: string;
  options: readonly { value: string; label: string }[];
  onChange: (value: string) => void;
}

/** One of a few choices, as words that can be changed. */
export function InlineSelect({ name, value, options, onChange }: InlineSelectProps) {
  return (
    <select
      aria-label={name}
      value={value}
      onChange={({ target }) => onChange(target.value)}
      className="min-h-7 w-full min-w-0 border-field border-b bg-transparent hover:border-ink"
    >
      {options.map((option) => (
        <option key={option.value} value={option.value} className="bg-ground text-ink">
          {option.label}
        </option>
      ))}
    </select>
  );
}
