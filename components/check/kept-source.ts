/** What is being checked, kept in this browser tab: it survives a look at another page and a reload. */
import type { CsvDraft } from './csv-draft';
import type { Source } from './read-source';

const KEY = 'curvekeep.check';

export interface KeptSource {
  source: Source;
  draft: CsvDraft | null;
}

/** Keeps a source; one that the browser has no room for is not kept, and the page goes on. */
export function keepSource(kept: KeptSource): void {
  try {
    sessionStorage.setItem(KEY, JSON.stringify(kept));
  } catch {
    sessionStorage.removeItem(KEY);
  }
}

/** What was kept in this tab, or null. */
export function keptSource(): KeptSource | null {
  try {
    return JSON.parse(sessionStorage.getItem(KEY) ?? 'null');
  } catch {
    return null;
  }
}
