'use client';

import { type ReactNode, useMemo, useState } from 'react';
import { AssessedView, type Look } from '@/components/assessed/assessed-view';
import { openingWindow } from '@/components/plots/energy-window';
import { plotDataOf, pointsOf } from '@/components/plots/plot-data';
import { Disclosure } from '@/components/ui/disclosure';
import { type DepositState, stateWords } from '@/lib/deposits/states';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

interface AssessedRecordProps {
  document: DatasetDocument;
  assessment: Assessment;
  laboratory: string;
  state: DepositState;
  /** what the link to it says where the columns are rows; left out: the state */
  toDo?: string;
  /** above the verdict: the state, or the decision */
  aside: ReactNode;
}

/** A revision of a deposit as it was assessed, beside what can be done about it. */
export function AssessedRecord({
  document,
  assessment,
  laboratory,
  state,
  toDo,
  aside,
}: AssessedRecordProps) {
  const data = useMemo(() => plotDataOf(document, assessment), [document, assessment]);
  const [look, setLook] = useState<Look>({ window: openingWindow(pointsOf(data)), byLigand: null });
  return (
    <AssessedView
      data={data}
      look={look}
      onLook={setLook}
      head={<RecordHead document={document} laboratory={laboratory} state={state} toDo={toDo} />}
      aside={
        <div id="state" className="mb-6 scroll-mt-28 border-ink border-b pb-5">
          {aside}
        </div>
      }
    />
  );
}

const METHOD_WORDS: Record<DatasetDocument['normalisation']['method'], string> = {
  absolute: 'absolute',
  'two-reference': 'to two references',
  'series-min-max': 'each series to its own range',
};

interface RecordHeadProps {
  document: DatasetDocument;
  laboratory: string;
  state: DepositState;
  toDo?: string;
}

function RecordHead({ document, laboratory, state, toDo }: RecordHeadProps) {
  const words = stateWords(state);
  const { title, abstract, assay, contributors, licence, system, normalisation } = document;
  const rows: [string, string][] = [
    ['System', system],
    ['Readout', assay.readout],
    ['Conditions', assay.conditions],
    ['Normalised', [METHOD_WORDS[normalisation.method], normalisation.note].filter(Boolean).join('; ')],
    ['Licence', licence],
  ];
  return (
    <header>
      <h1 className="head break-words text-xl">{title}</h1>
      <p className="mt-1 text-sm text-soft">{laboratory}</p>
      {/* What is to be done stands below statements and plot where the columns are rows. */}
      <p className="mt-2 text-sm lg:hidden">
        <a href="#state" className="inline-flex min-h-6 items-center font-semibold text-act">
          {toDo ?? `${words.charAt(0).toUpperCase() + words.slice(1)}: what there is to do`}
        </a>
      </p>
      <Disclosure className="mt-2" summary="Abstract, assay, contributors">
        <p className="whitespace-pre-wrap break-words text-sm">{abstract}</p>
        <dl className="mt-2 text-sm">
          {rows
            .filter(([, words]) => words.trim() !== '')
            .map(([label, words]) => (
              <div key={label} className="grid grid-cols-[5.5rem_minmax(0,1fr)] gap-x-3 py-0.5">
                <dt className="text-soft">{label}</dt>
                <dd className="break-words">{words}</dd>
              </div>
            ))}
        </dl>
        <ul className="mt-2 text-sm">
          {contributors.map(({ name, orcid, roles }) => (
            <li key={`${name} ${orcid ?? ''}`} className="py-0.5">
              {name}
              {orcid ? <span className="figures text-soft"> {orcid}</span> : null}
              <span className="block text-soft text-xs">{roles.join(', ')}</span>
            </li>
          ))}
        </ul>
      </Disclosure>
    </header>
  );
}
