/** Which part of the editor shows a place of the document, and where its field is. */
import { membersOf } from '@/lib/documents/json-pointer';

export type EditorSection = 'identity' | 'assay' | 'ligands' | 'series';

const SECTIONS: Record<string, EditorSection> = {
  assay: 'assay',
  temperature: 'assay',
  normalisation: 'assay',
  ligands: 'ligands',
  modulators: 'ligands',
  series: 'series',
};

export interface Place {
  section: EditorSection;
  series: number | null;
  /** index of the point in its series */
  point: number | null;
}

export function placeOf(pointer: string): Place {
  const [part = '', series, what, point] = membersOf(pointer);
  const section = SECTIONS[part] ?? 'identity';
  return {
    section,
    series: section === 'series' ? indexOf(series) : null,
    point: what === 'points' ? indexOf(point) : null,
  };
}

function indexOf(member: string | undefined): number | null {
  return member !== undefined && /^\d+$/.test(member) ? Number(member) : null;
}

/**
 * The control of a place: its own, or that of the statement around it. Null where the form has none.
 */
export function controlOf(root: ParentNode, pointer: string): HTMLElement | null {
  const around = pointer.slice(0, pointer.lastIndexOf('/'));
  for (const wanted of [pointer, `${pointer}/activity`, `${pointer}/replicates`, around]) {
    if (wanted === '') continue;
    const found = root.querySelector<HTMLElement>(`[data-pointer="${CSS.escape(wanted)}"]`);
    if (found !== null) return controlIn(found);
  }
  return null;
}

const CONTROLS = 'input, select, textarea, summary, button';

function controlIn(element: HTMLElement): HTMLElement | null {
  return element.matches(CONTROLS) ? element : element.querySelector<HTMLElement>(CONTROLS);
}
