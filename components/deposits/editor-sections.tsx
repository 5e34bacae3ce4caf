import { Button } from '@/components/ui/button';
import type { SelectOption } from '@/components/ui/select-field';
import { AssaySection } from './assay-section';
import type { DraftAccess } from './draft-access';
import type { EditorSection } from './go-to-place';
import { IdentitySection } from './identity-section';
import { LigandSection } from './ligand-section';
import { SeriesSection } from './series-section';

const SECTIONS: [EditorSection, string][] = [
  ['identity', 'Identity'],
  ['assay', 'Assay'],
  ['ligands', 'Ligands'],
  ['series', 'Series'],
];

interface EditorSectionsProps {
  draft: DraftAccess;
  systems: readonly SelectOption[];
  section: EditorSection;
  onSection: (section: EditorSection) => void;
  series: number;
  onSeries: (series: number) => void;
}

/** The document as a form, a part at a time. */
export function EditorSections({
  draft,
  systems,
  section,
  onSection,
  series,
  onSeries,
}: EditorSectionsProps) {
  return (
    <>
      <nav aria-label="Parts of the document" className="mt-4 mb-5 flex flex-wrap gap-x-5">
        {SECTIONS.map(([key, label]) => (
          <Button
            key={key}
            aria-current={section === key ? 'true' : undefined}
            onClick={() => onSection(key)}
            className="min-h-8 border-transparent border-b-2 font-normal aria-[current=true]:border-ink aria-[current=true]:font-semibold aria-[current=true]:text-ink"
          >
            {label}
          </Button>
        ))}
      </nav>
      {section === 'identity' ? <IdentitySection draft={draft} systems={systems} /> : null}
      {section === 'assay' ? <AssaySection draft={draft} /> : null}
      {section === 'ligands' ? <LigandSection draft={draft} /> : null}
      {section === 'series' ? <SeriesSection draft={draft} chosen={series} onChoose={onSeries} /> : null}
    </>
  );
}
