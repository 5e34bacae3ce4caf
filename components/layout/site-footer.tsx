import Link from 'next/link';
import { POLICY } from '@/lib/engine/flags';
import { ENGINE_VERSION } from '@/lib/engine/version';
import type { Theme } from './theme';
import { ThemeSwitch } from './theme-switch';

interface SiteFooterProps {
  theme: Theme;
  setTheme: (form: FormData) => Promise<void>;
}

const LINK = 'inline-flex min-h-6 items-center hover:text-ink hover:underline';

/** Cautions, the machine-readable descriptions, and what computed the figures: at the foot of every page. */
export function SiteFooter({ theme, setTheme }: SiteFooterProps) {
  return (
    <footer className="border-hairline border-t text-sm text-soft">
      <div className="page-width">
        <div className="axis-grid gap-y-6 py-8">
          <nav aria-label="Reference" className="no-print">
            <ul className="flex flex-wrap gap-x-5 gap-y-1 lg:flex-col">
              <li>
                <Link href="/methods" className={LINK}>
                  Methods and policy
                </Link>
              </li>
              <li>
                <a href="/api/v1/openapi.json" className={LINK}>
                  API description (OpenAPI)
                </a>
              </li>
              <li>
                <a href="/api/v1/schemas/dataset-1" className={LINK}>
                  Dataset schema
                </a>
              </li>
            </ul>
          </nav>
          <div className="max-w-[42rem] space-y-2 lg:pr-7">
            <p>
              <strong className="font-semibold text-ink">Research data only.</strong> Not for diagnosis,
              dosing or safety decisions. Local rules and licensed practice come first.
            </p>
            <p>
              All demonstration data are invented: invented laboratories, people, proteins and ligands. Do not
              enter personal or patient-identifiable data.
            </p>
          </div>
          <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2 lg:flex-col lg:justify-start lg:pl-7">
            <p className="figures">
              Engine {ENGINE_VERSION}, policy {POLICY.number}
            </p>
            <div className="no-print">
              <ThemeSwitch theme={theme} setTheme={setTheme} />
            </div>
          </div>
        </div>
      </div>
    </footer>
  );
}
