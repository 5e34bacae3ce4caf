'use client';

import { useMutation } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { AssessedView, type Look } from '@/components/assessed/assessed-view';
import type { DepositingLab } from '@/components/deposits/lab-choice';
import { openingWindow } from '@/components/plots/energy-window';
import { type PlotData, pointsOf } from '@/components/plots/plot-data';
import { StatedBand } from '@/components/reasons/stated-band';
import type { StatedReading } from '@/components/reasons/why-it-misses';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import { assessSource, type SourceOutcome } from './assess-source';
import { type CsvDraft, draftFor } from './csv-draft';
import { DatasetHead } from './dataset-head';
import { type ExampleSlug, loadExample, loadExampleTable } from './example-words';
import { KeepDraft } from './keep-draft';
import { keepSource, keptSource } from './kept-source';
import { kindOf, type Source } from './read-source';
import { SourceView } from './source-view';
import { readAddress, useAddress } from './use-address';

const EMPTY: Source = { text: '', name: null };

interface Job {
  source: Source;
  draft: CsvDraft | null;
  example: ExampleSlug | null;
}

interface Restated {
  reading: StatedReading;
  becameDocument: boolean;
  before: Job;
}

interface CheckWorkspaceProps {
  /** the laboratories that the reader may keep a draft for; none for a visitor */
  labs?: readonly DepositingLab[];
}

/** The page on which data are checked: first what is to be checked, then what it amounts to. */
export function CheckWorkspace({ labs = [] }: CheckWorkspaceProps) {
  const [source, setSource] = useState<Source>(EMPTY);
  const [draft, setDraft] = useState<CsvDraft | null>(null);
  const [example, setExample] = useState<ExampleSlug | null>(null);
  const [outcome, setOutcome] = useState<SourceOutcome | null>(null);
  const [editing, setEditing] = useState(true);
  const [data, setData] = useState<PlotData | null>(null);
  /** what `data` was made from */
  const [assessed, setAssessed] = useState<Job | null>(null);
  const [look, setLook] = useState<Look | null>(null);
  /** what was stated otherwise from a reason, and what stood before */
  const [restated, setRestated] = useState<Restated | null>(null);
  const abort = useRef<AbortController | null>(null);

  const { mutate, isPending } = useMutation({
    mutationFn: ({ source: given, draft: form }: Job) => {
      abort.current?.abort();
      abort.current = new AbortController();
      return assessSource(given, form, abort.current.signal);
    },
    onSuccess: (found, job) => {
      setOutcome(found);
      if (found.kind !== 'assessed') return setEditing(true);
      setData(found.data);
      setAssessed(job);
      setLook(openingLook(found.data, job.example));
      setEditing(false);
      window.scrollTo({ top: 0 });
    },
  });

  const change = (next: Source) => {
    // An answer that is still on its way is about another text.
    abort.current?.abort();
    setSource(next);
    setExample(null);
    setOutcome(null);
    setRestated(null);
    if (next.text.trim() !== '' && kindOf(next) === 'table')
      setDraft((earlier) => draftFor(readCsvPoints(next.text), earlier));
  };
  const open = async (slug: ExampleSlug) => {
    const next = { text: await loadExample(slug), name: null };
    change(next);
    setExample(slug);
    mutate({ source: next, draft: null, example: slug });
  };
  const openTable = async () => {
    abort.current?.abort();
    const table = await loadExampleTable();
    setSource({ text: table.text, name: null });
    setDraft(table.draft);
    setExample(null);
    setOutcome(null);
    setRestated(null);
  };
  const check = (job: Job) => {
    setSource(job.source);
    setDraft(job.draft);
    setExample(job.example);
    mutate(job);
  };
  // A source that was edited since would lose what was typed.
  const isCurrent =
    assessed?.source === source && (kindOf(source) === 'document' || assessed.draft === draft);
  const latest = useRef(source);
  useEffect(() => {
    latest.current = source;
  });
  const state = async (reading: StatedReading) => {
    if (data === null || isPending) return;
    const { stateInSource } = await import('./state-source');
    if (latest.current !== source) return;
    const { becameDocument, ...next } = stateInSource(source, draft, data.document, reading);
    setRestated({ reading, becameDocument, before: { source, draft, example } });
    check({ ...next, example: null });
  };
  const undo = () => {
    if (restated === null) return;
    setRestated(null);
    check(restated.before);
  };

  const keep = (
    <KeepDraft
      labs={labs}
      source={source}
      draft={draft}
      onToMend={(found) => {
        setOutcome(found);
        setEditing(true);
      }}
    />
  );
  const showsResult = !editing && data !== null && look !== null;
  useAddress(
    showsResult ? { example, window: changedWindow(data, look), byLigand: look.byLigand } : null,
    (toResult) => setEditing(!toResult),
  );
  // An address with an example opens it, once; else what was being checked in this tab is there again.
  const opened = useRef(false);
  useEffect(() => {
    if (opened.current) return;
    opened.current = true;
    const { example: asked } = readAddress(window.location.search);
    const kept = keptSource();
    if (asked !== null) void open(asked);
    else if (kept !== null) {
      setSource(kept.source);
      setDraft(kept.draft);
    }
  });
  useEffect(() => {
    if (source === EMPTY) return;
    const timer = setTimeout(() => keepSource({ source, draft }), 400);
    return () => clearTimeout(timer);
  }, [source, draft]);

  if (showsResult) {
    return (
      <AssessedView
        data={data}
        look={look}
        onLook={setLook}
        onState={isCurrent ? (reading) => void state(reading) : undefined}
        stated={restated === null ? null : <RestatedBand restated={restated} onUndo={undo} />}
        head={
          <DatasetHead data={data} invented={example !== null} onEdit={() => setEditing(true)} keep={keep} />
        }
      />
    );
  }
  return (
    <SourceView
      source={source}
      draft={draft}
      outcome={outcome}
      busy={isPending}
      hasResult={data !== null}
      onSource={change}
      onDraft={(next) => {
        setDraft(next);
        setRestated(null);
      }}
      onRefused={(detail) => setOutcome({ kind: 'refused', title: 'This file was not taken', detail })}
      onAssess={() => mutate({ source, draft, example })}
      onExample={(slug) => void open(slug)}
      onTable={openTable}
      onResult={() => setEditing(false)}
      keep={keep}
    />
  );
}

function RestatedBand({ restated, onUndo }: { restated: Restated; onUndo: () => void }) {
  const { reading, becameDocument } = restated;
  return (
    <StatedBand noun={reading.noun} label={reading.label} onUndo={onUndo}>
      {becameDocument
        ? 'Your table has become a document, since its form has no place for this.'
        : 'What you pasted now says so.'}
    </StatedBand>
  );
}

/** An address may ask for a window and a ligand of its example; anything else opens with all of the bend. */
function openingLook(data: PlotData, example: ExampleSlug | null): Look {
  const asked = readAddress(window.location.search);
  const fits = example !== null && asked.example === example;
  const known = data.document.ligands.some(({ id }) => id === asked.byLigand);
  return {
    window: (fits && asked.window) || openingWindow(pointsOf(data)),
    byLigand: fits && known ? asked.byLigand : null,
  };
}

/** The window for the address; null while it is the one that the dataset opens with. */
function changedWindow(data: PlotData, { window }: Look) {
  const opening = openingWindow(pointsOf(data));
  return window.from === opening.from && window.to === opening.to ? null : window;
}
