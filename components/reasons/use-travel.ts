'use client';

import { useEffect, useState } from 'react';
import { TRAVEL_MILLISECONDS } from '@/components/plots/collapse-option';
import { STILL, useMedia } from '@/components/ui/use-media';
import { canTravel, type Scene, sceneBetween } from './travel';

const MOST_MILLISECONDS_A_FRAME = 80;

export interface Journey {
  /** another one for every journey */
  number: number;
  /** null: there is none */
  from: Scene | null;
}

/** What is drawn: `to`, or on the way there from where a journey began. Where less motion is wanted, `to` at once. */
export function useTravel({ number, from }: Journey, to: Scene | null): Scene | null {
  const still = useMedia(STILL);
  const [progress, setProgress] = useState({ number, share: 1 });
  const isUnderway = from !== null && !still;
  useEffect(() => {
    if (!isUnderway) return;
    let share = 0;
    let last = performance.now();
    let frame = requestAnimationFrame(function draw(now) {
      // A machine that is slow to draw takes longer; it does not jump.
      const passed = Math.min(MOST_MILLISECONDS_A_FRAME, Math.max(0, now - last));
      last = now;
      share = Math.min(1, share + passed / TRAVEL_MILLISECONDS);
      setProgress({ number, share });
      if (share < 1) frame = requestAnimationFrame(draw);
    });
    return () => cancelAnimationFrame(frame);
  }, [number, isUnderway]);
  const share = still ? 1 : progress.number === number ? progress.share : 0;
  if (share === 1 || from === null || to === null || !canTravel(from, to)) return to;
  return sceneBetween(from, to, share);
}
