import type { ReactNode } from 'react';
import { AxisFrame } from './axis-frame';
import { CURVE_FIGURE_WINDOW, CurveFigure } from './curve-figure';
import { EnergyRuler } from './energy-ruler';

interface DeadEndProps {
  title: string;
  /** what happened */
  children: ReactNode;
  /** what to do now */
  ways: ReactNode;
}

/** A page for what cannot be shown: what happened on the left, the empty curve, what to do on the right. */
export function DeadEnd({ title, children, ways }: DeadEndProps) {
  return (
    <AxisFrame
      who={
        <>
          <h1 className="head text-3xl">{title}</h1>
          <div className="mt-3 max-w-[30rem] space-y-3 text-lg text-soft leading-snug">{children}</div>
        </>
      }
      axis={
        <div className="max-lg:hidden">
          <CurveFigure />
          <div className="border-ink border-y">
            <EnergyRuler {...CURVE_FIGURE_WINDOW} />
          </div>
        </div>
      }
      verdict={
        <>
          <h2 className="font-semibold">What to do</h2>
          <div className="mt-2 flex flex-col items-start gap-2">{ways}</div>
        </>
      }
    />
  );
}
