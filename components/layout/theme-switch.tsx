import { THEMES, type Theme } from './theme';

interface ThemeSwitchProps {
  theme: Theme;
  setTheme: (form: FormData) => Promise<void>;
}

const LABELS: Record<Theme, string> = { system: 'System', light: 'Light', dark: 'Dark' };

/** Light, dark, or what the system prefers. A plain form, so that it works before any script has run. */
export function ThemeSwitch({ theme, setTheme }: ThemeSwitchProps) {
  return (
    <form action={setTheme}>
      <fieldset className="flex items-center gap-x-4">
        <legend className="sr-only">Appearance</legend>
        {THEMES.map((choice) => (
          <button
            key={choice}
            type="submit"
            name="theme"
            value={choice}
            aria-pressed={choice === theme}
            className="min-h-6 border-transparent border-b text-soft hover:text-ink aria-pressed:border-ink aria-pressed:text-ink"
          >
            {LABELS[choice]}
          </button>
        ))}
      </fieldset>
    </form>
  );
}
