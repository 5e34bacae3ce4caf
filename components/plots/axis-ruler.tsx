import type { ReactNode } from 'react';
import { MINUS } from '@/components/ui/format-quantity';
import { type EnergyWindow, pixelOf, roundEdge, ticksOf } from './energy-window';

export function signedLabel(energy: number): string {
  return String(roundEdge(energy)).replace('-', MINUS);
}

interface AxisRulerProps {
  window: EnergyWindow;
  /** of the axis column, pixels; 0 until it is known */
  width: number;
  /** marks under the ticks */
  children?: ReactNode;
}

/** The energy axis as a ruler, in kT, with as many labels as its width holds. */
export function AxisRuler({ window, width, children }: AxisRulerProps) {
  return (
    <svg width={width} height={32} aria-hidden="true" className="figures block text-xs">
      {children}
      {width > 0 ? <Ticks window={window} width={width} /> : null}
      <text x={8} y={22} className="fill-ink font-semibold">
        kT
      </text>
    </svg>
  );
}

function Ticks({ window, width }: { window: EnergyWindow; width: number }) {
  return ticksOf(window, width).map(({ energy, labelled }) => {
    const x = pixelOf(energy, window, width);
    const fits = labelled && x > 34 && x < width - 12;
    return (
      <g key={energy}>
        <line x1={x} x2={x} y1={0} y2={labelled ? 7 : 4} className="stroke-field" />
        {fits ? (
          <text x={x} y={22} textAnchor="middle" className="fill-soft">
            {signedLabel(energy)}
          </text>
        ) : null}
      </g>
    );
  });
}
