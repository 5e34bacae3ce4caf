import { formatFixed, formatQuantity } from '@/components/ui/format-quantity';
import { unitLabel } from '@/components/ui/unit-label';
import type { Ligand } from '@/schemas/dataset-1.generated';
import { CiteRow } from './cite-row';
import { ContributorList } from './contributor-list';
import type { PublishedRecord } from './dataset-page';
import { FileList } from './file-list';
import { RecordRow } from './record-row';
import { RevisionList } from './revision-list';

/** What is on record about a dataset: abstract, people, how it was measured, files, revisions, how to cite it. */
export function DatasetRecord({ dataset }: { dataset: PublishedRecord }) {
  const { document, files, revisions, revision, citation } = dataset;
  return (
    <div className="page-width pb-12">
      <div className="border-ink border-t" />
      <RecordRow title="Abstract">
        <p className="text-pretty font-serif text-lg leading-[1.55]">{document.abstract}</p>
      </RecordRow>
      <RecordRow title="Contributors" aside={<FundingList funding={document.funding ?? []} />}>
        <ContributorList contributors={document.contributors} />
      </RecordRow>
      <RecordRow title="How it was measured">
        <MeasuredList dataset={dataset} />
      </RecordRow>
      {document.related?.length ? (
        <RecordRow title="Related works">
          <ul className="space-y-1">
            {document.related.map(({ identifier, relation }) => (
              <li key={`${relation} ${identifier}`}>
                <span className="text-soft">{wordsOf(relation)}</span>{' '}
                <a
                  href={addressOf(identifier)}
                  rel="noreferrer nofollow"
                  className="break-all text-act underline underline-offset-4"
                >
                  {identifier}
                </a>
              </li>
            ))}
          </ul>
        </RecordRow>
      ) : null}
      <RecordRow title="Licence">
        <Licence licence={document.licence} />
      </RecordRow>
      <RecordRow title="Files" aside="As the laboratory attached them.">
        <FileList files={files} />
      </RecordRow>
      <RecordRow title="Revisions" aside="Each is kept as it was, with its assessment.">
        <RevisionList revisions={revisions} shown={revision} />
      </RecordRow>
      <CiteRow citation={citation} />
    </div>
  );
}

const METHODS = {
  absolute: 'not scaled',
  'two-reference': 'to a stated 0 and 1',
  'series-min-max': 'each series to its own smallest and largest',
} as const;

function MeasuredList({ dataset: { document } }: { dataset: PublishedRecord }) {
  const { assay, temperature, ligands, modulators = [], normalisation } = document;
  const rows: [string, string][] = [
    ['Readout', assay.readout],
    ['Conditions', assay.conditions],
    ['Temperature', formatQuantity(temperature.value, temperature.u, unitLabel(temperature.unit))],
    ...ligands.map((ligand): [string, string] => [`Ligand ${ligand.name}`, ligandWords(ligand)]),
    ...modulators.map(({ name, unit }): [string, string] => [`Modulator ${name}`, `in ${unit}`]),
    ['Normalisation', [METHODS[normalisation.method], normalisation.note].filter(Boolean).join('; ')],
  ];
  if (assay.proteinConcentration) {
    const { value, unit } = assay.proteinConcentration;
    rows.push(['Protein', formatQuantity(value, 0, unitLabel(unit))]);
  }
  return (
    <dl>
      {rows
        .filter(([, words]) => words.trim() !== '')
        .map(([label, words]) => (
          <div
            key={label}
            className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-4 border-hairline border-b py-1.5 last:border-b-0 max-sm:grid-cols-1"
          >
            <dt className="text-soft">{label}</dt>
            <dd className="figures break-words">{words}</dd>
          </div>
        ))}
    </dl>
  );
}

function ligandWords({ unit, concentration, relativeU, stockRelativeU }: Ligand): string {
  const parts = [
    `${concentration} concentration in ${unitLabel(unit)}`,
    relativeU ? `each known to ${percent(relativeU)}` : null,
    stockRelativeU ? `its stock to ${percent(stockRelativeU)}` : null,
  ];
  return parts.filter(Boolean).join(', ');
}

function percent(share: number): string {
  return `${formatFixed(share * 100, share < 0.01 ? 2 : 1)}\u00a0%`;
}

function FundingList({ funding }: { funding: { funder: string; award?: string }[] }) {
  if (funding.length === 0) return null;
  return (
    <p>
      Funded by {funding.map(({ funder, award }) => (award ? `${funder} (${award})` : funder)).join('; ')}.
    </p>
  );
}

const LICENCES: Record<string, { name: string; href: string }> = {
  'CC-BY-4.0': {
    name: 'Creative Commons Attribution 4.0 International (CC-BY-4.0)',
    href: 'https://creativecommons.org/licenses/by/4.0/',
  },
  'CC0-1.0': {
    name: 'CC0 1.0 Universal, public domain dedication (CC0-1.0)',
    href: 'https://creativecommons.org/publicdomain/zero/1.0/',
  },
};

function Licence({ licence }: { licence: string }) {
  const known = LICENCES[licence];
  if (!known) return <p>{licence}</p>;
  return (
    <p>
      <a
        href={known.href}
        rel="license noreferrer"
        className="inline-block min-h-6 text-act underline underline-offset-4"
      >
        {known.name}
      </a>
    </p>
  );
}

/** `IsSupplementTo` as people say it. */
function wordsOf(relation: string): string {
  const words = relation.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** A DOI resolves at the resolver; an https address is one already. */
function addressOf(identifier: string): string {
  return identifier.startsWith('https://') ? identifier : `https://doi.org/${identifier}`;
}
