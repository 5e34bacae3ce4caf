import { type ReactNode, useEffect, useRef } from 'react';
import { Button } from '@/components/ui/button';

interface StatedBandProps {
  noun: string;
  /** label of the one series; null for all */
  label: string | null;
  /** what else came of it */
  children?: ReactNode;
  onUndo: () => void;
}

/** What was just stated otherwise, and the way back. */
export function StatedBand({ noun, label, children, onUndo }: StatedBandProps) {
  const undo = useRef<HTMLButtonElement>(null);
  // The button that was pressed is gone: without this the focus would be lost.
  useEffect(() => undo.current?.focus({ preventScroll: true }), []);
  return (
    <p
      role="status"
      className="flex flex-wrap items-baseline gap-x-4 border-hairline border-b bg-wash px-2 py-2 text-sm max-lg:-mx-4 max-lg:px-4"
    >
      <span>
        <span className="font-semibold">Stated so:</span> {label ?? 'all series'}, with {noun}. {children}
      </span>
      <Button ref={undo} className="text-sm" onClick={onUndo}>
        Undo
      </Button>
    </p>
  );
}
