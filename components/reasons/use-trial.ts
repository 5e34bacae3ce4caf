'use client';

import { useMutation } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { Reading } from '@/components/engine/reading';
import { runInEngine } from '@/components/engine/run-in-engine';
import { type EnergyWindow, openingWindow } from '@/components/plots/energy-window';
import { type PlotData, plotDataOf, pointsOf } from '@/components/plots/plot-data';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { type Scene, unionOf } from './travel';
import { type Journey, useTravel } from './use-travel';

/** What is to be tried, and how it is called. */
export interface TrialSubject {
  key: string;
  /** the reading as a thing: “the gap read as active − inactive” */
  noun: string;
  /** whose: the label of one series; null for the whole dataset */
  label: string | null;
  /** place of that series; null for the whole dataset */
  index: number | null;
  reading: Reading;
}

export interface Trial extends Scene {
  subject: TrialSubject;
}

export interface Trials {
  /** null while what was stated is shown */
  trial: Trial | null;
  /** whether a trial was left for what was stated */
  hasReturned: boolean;
  /** key of what is being computed */
  pending: string | null;
  failure: { key: string; detail: string } | null;
  start: (subject: TrialSubject) => void;
  stop: () => void;
  /** as stated or as tried */
  scene: Scene | null;
  /** the same, while points travel on their way */
  drawn: Scene | null;
  onWindow: (window: EnergyWindow) => void;
}

interface TrialOptions {
  /** null while there is nothing to be tried on */
  stated: PlotData | null;
  window: EnergyWindow;
  onWindow?: (window: EnergyWindow) => void;
  /** fetches the document where the points at hand are not all of it */
  wholeDocument?: (signal: AbortSignal) => Promise<DatasetDocument>;
}

/**
 * Other readings of a dataset, tried in the browser and never saved. A trial has a window of its own, so that going
 * back shows exactly what was there; it ends by itself where what was stated changes.
 */
export function useTrial({ stated, window, onWindow, wholeDocument }: TrialOptions): Trials {
  const [shown, setShown] = useState<Trial | null>(null);
  const [journey, setJourney] = useState<Journey>({ number: 0, from: null });
  const abort = useRef<AbortController | null>(null);
  // The summary is the very object of the answer, whatever is put around it.
  const of = stated?.assessment.summary ?? null;
  const [basis, setBasis] = useState(of);
  if (basis !== of) {
    setBasis(of);
    setShown(null);
    setJourney(({ number }) => ({ number: number + 1, from: null }));
  }
  const trial = basis === of ? shown : null;
  const atHome = stated === null ? null : { data: stated, window };
  const scene = trial ?? atHome;

  const depart = (to: Trial | null) => {
    setJourney(({ number }) => ({ number: number + 1, from: scene }));
    setShown(to);
  };
  const { mutate, isPending, variables, error, reset } = useMutation({
    networkMode: 'always',
    mutationFn: async (subject: TrialSubject) => {
      abort.current?.abort();
      const controller = new AbortController();
      abort.current = controller;
      const { signal } = controller;
      const document = wholeDocument ? await wholeDocument(signal) : (stated?.document as DatasetDocument);
      const tried = await runInEngine('try', { document, reading: subject.reading }, { signal });
      return { of, subject, data: plotDataOf(tried.document, tried.assessment) };
    },
    onSuccess: ({ of: asked, subject, data }) => {
      if (asked !== basis) return;
      depart({ subject, data, window: unionOf(window, openingWindow(pointsOf(data))) });
    },
  });
  const stop = () => {
    abort.current?.abort();
    reset();
    if (trial !== null) depart(null);
  };
  useEscape(trial !== null || isPending, stop);
  useEffect(() => () => abort.current?.abort(), []);

  return {
    trial,
    hasReturned: trial === null && journey.from !== null,
    pending: isPending ? (variables?.key ?? null) : null,
    failure: error && !isAbort(error) && variables ? { key: variables.key, detail: error.message } : null,
    start: mutate,
    stop,
    scene,
    drawn: useTravel(journey, scene),
    onWindow: (next) => (trial === null ? onWindow?.(next) : setShown({ ...trial, window: next })),
  };
}

function isAbort(error: Error): boolean {
  return error.name === 'AbortError';
}

/** Escape leaves, wherever the focus is, unless something else has used it. */
function useEscape(active: boolean, leave: () => void): void {
  const latest = useRef(leave);
  useEffect(() => {
    latest.current = leave;
  });
  useEffect(() => {
    if (!active) return;
    const listen = (event: KeyboardEvent) => {
      if (event.key === 'Escape' && !event.defaultPrevented) latest.current();
    };
    document.addEventListener('keydown', listen);
    return () => document.removeEventListener('keydown', listen);
  }, [active]);
}
