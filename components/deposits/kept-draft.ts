/** Changes that are not saved yet, kept in this browser tab: they outlive a look at another page and a reload. */

export interface KeptDraft {
  /** the version that they change */
  version: number;
  text: string;
}

const keyOf = (id: string) => `curvekeep.deposit.${id}`;

/** Keeps them; null: there are none any more. What the browser has no room for is not kept, and the page goes on. */
export function keepDraft(id: string, kept: KeptDraft | null): void {
  try {
    if (kept === null) sessionStorage.removeItem(keyOf(id));
    else sessionStorage.setItem(keyOf(id), JSON.stringify(kept));
  } catch {
    sessionStorage.removeItem(keyOf(id));
  }
}

/** What was kept in this tab, or null. */
export function keptDraft(id: string): KeptDraft | null {
  try {
    return JSON.parse(sessionStorage.getItem(keyOf(id)) ?? 'null');
  } catch {
    return null;
  }
}
