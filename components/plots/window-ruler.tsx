'use client';

import { type KeyboardEvent, type PointerEvent, useRef, useState } from 'react';
import { AxisRuler, signedLabel } from './axis-ruler';
import {
  type EnergyWindow,
  energyAtPixel,
  keptWithin,
  moveWindow,
  orderedWindow,
  roundEdge,
  scaleWindow,
} from './energy-window';
import { useSize } from './use-size';

interface WindowRulerProps {
  window: EnergyWindow;
  /** all energies: what the window returns to */
  full: EnergyWindow;
  onChange: (window: EnergyWindow) => void;
}

/** A movement shorter than this is a click, pixels. */
const LEAST_DRAG = 5;

/**
 * The energy axis as a ruler on which a window is chosen: by dragging along it, or by keys (arrows move the
 * window, plus and minus narrow and widen it, Home shows all energies).
 */
export function WindowRuler({ window, full, onChange }: WindowRulerProps) {
  const box = useRef<HTMLDivElement>(null);
  const { width } = useSize(box);
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null);

  const pixelIn = (event: PointerEvent) => {
    const left = box.current?.getBoundingClientRect().left ?? 0;
    return Math.max(0, Math.min(width, event.clientX - left));
  };
  const finish = () => {
    if (drag && Math.abs(drag.to - drag.from) >= LEAST_DRAG) {
      const chosen = orderedWindow(
        energyAtPixel(drag.from, window, width),
        energyAtPixel(drag.to, window, width),
      );
      if (chosen) onChange({ from: roundEdge(chosen.from), to: roundEdge(chosen.to) });
    }
    setDrag(null);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const next = windowAfterKey(event.key, window, full);
    if (!next) return;
    event.preventDefault();
    onChange({ from: roundEdge(next.from), to: roundEdge(next.to) });
  };
  return (
    <div
      ref={box}
      role="slider"
      tabIndex={0}
      aria-label="Window of energies. Arrow keys move it, plus and minus narrow and widen it, Home shows all energies."
      aria-valuemin={full.from}
      aria-valuemax={full.to}
      aria-valuenow={roundEdge((window.from + window.to) / 2)}
      aria-valuetext={`${signedLabel(window.from)} to ${signedLabel(window.to)} kT`}
      className="relative h-8 cursor-col-resize touch-pan-y select-none"
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        setDrag({ from: pixelIn(event), to: pixelIn(event) });
      }}
      onPointerMove={(event) => drag && setDrag({ ...drag, to: pixelIn(event) })}
      onPointerUp={finish}
      onPointerCancel={() => setDrag(null)}
    >
      <AxisRuler window={window} width={width}>
        {drag ? (
          <rect
            x={Math.min(drag.from, drag.to)}
            width={Math.abs(drag.to - drag.from)}
            height={32}
            className="fill-act/25"
          />
        ) : null}
      </AxisRuler>
    </div>
  );
}

/** The window that a key makes of a window; null where the key has no meaning here. */
export function windowAfterKey(key: string, window: EnergyWindow, full: EnergyWindow): EnergyWindow | null {
  switch (key) {
    case 'ArrowLeft':
    case 'ArrowDown':
      return keptWithin(moveWindow(window, -0.1), full);
    case 'ArrowRight':
    case 'ArrowUp':
      return keptWithin(moveWindow(window, 0.1), full);
    case 'PageDown':
      return keptWithin(moveWindow(window, -0.5), full);
    case 'PageUp':
      return keptWithin(moveWindow(window, 0.5), full);
    case '+':
    case '=':
      return scaleWindow(window, 0.8);
    case '-':
      return keptWithin(scaleWindow(window, 1.25), full);
    case 'Home':
    case 'Escape':
      return full;
    default:
      return null;
  }
}
