'use client';

import { useMutation } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { runInEngine } from '@/components/engine/run-in-engine';
import type { FreeParameter } from '@/lib/engine/free-parameters';
import type { RefitResult } from '@/lib/engine/refit';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

export interface Refitted {
  /** the document whose points were fitted */
  document: DatasetDocument;
  result: RefitResult;
}

/** A refit in the engine's worker, with its progress and the way to stop it. */
export function useRefit(wholeDocument: (signal: AbortSignal) => Promise<DatasetDocument>) {
  const abort = useRef<AbortController | null>(null);
  const [share, setShare] = useState(0);
  const { mutate, data, error, isPending } = useMutation({
    networkMode: 'always',
    mutationFn: async (free: readonly FreeParameter[]): Promise<Refitted> => {
      abort.current?.abort();
      const controller = new AbortController();
      abort.current = controller;
      setShare(0);
      const document = await wholeDocument(controller.signal);
      const given = { document, free };
      const result = await runInEngine('refit', given, { signal: controller.signal, onProgress: setShare });
      return { document, result };
    },
  });
  useEffect(() => () => abort.current?.abort(), []);
  const isStopped = error?.name === 'AbortError';
  return {
    start: mutate,
    stop: () => abort.current?.abort(),
    share,
    isRunning: isPending,
    isStopped,
    refitted: data ?? null,
    failure: error && !isStopped ? error.message : null,
  };
}
