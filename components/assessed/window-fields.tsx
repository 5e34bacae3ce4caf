'use client';

import { useState } from 'react';
import { type EnergyWindow, orderedWindow, roundEdge } from '@/components/plots/energy-window';
import { Button } from '@/components/ui/button';
import { NumberField } from '@/components/ui/number-field';
import { readNumber } from '@/components/ui/read-number';

interface WindowFieldsProps {
  window: EnergyWindow;
  full: EnergyWindow;
  onWindow: (window: EnergyWindow) => void;
}

/** The window's edges as numbers to be typed. */
export function WindowFields({ window, full, onWindow }: WindowFieldsProps) {
  // What is typed counts until the window moves by other means.
  const shown = `${roundEdge(window.from)} ${roundEdge(window.to)}`;
  const [typed, setTyped] = useState<{ shown: string; from: string; to: string } | null>(null);
  const current =
    typed?.shown === shown
      ? typed
      : { shown, from: String(roundEdge(window.from)), to: String(roundEdge(window.to)) };
  const wanted = orderedWindow(readNumber(current.from) ?? Number.NaN, readNumber(current.to) ?? Number.NaN);
  const isFull = window.from === full.from && window.to === full.to;
  return (
    <form
      className="no-print mt-1.5"
      onSubmit={(event) => {
        event.preventDefault();
        if (wanted) onWindow(wanted);
      }}
    >
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="from"
          unit="kT"
          value={current.from}
          onChange={({ target }) => setTyped({ ...current, from: target.value })}
        />
        <NumberField
          label="to"
          unit="kT"
          value={current.to}
          onChange={({ target }) => setTyped({ ...current, to: target.value })}
        />
      </div>
      {wanted === null ? (
        <p className="mt-1 text-off text-sm">Two numbers at least 0.2 kT apart, such as −4 and 4.</p>
      ) : null}
      <div className="mt-2 flex gap-4">
        <Button type="submit" disabled={wanted === null || typed === null}>
          Apply
        </Button>
        <Button onClick={() => onWindow(full)} disabled={isFull}>
          All energies
        </Button>
      </div>
    </form>
  );
}
