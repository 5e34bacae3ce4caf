import { type RefObject, useEffect, useState } from 'react';

export interface Size {
  width: number;
  height: number;
}

const UNKNOWN: Size = { width: 0, height: 0 };

/** The size of an element's content in pixels, kept up to date; 0 × 0 until it is known. */
export function useSize(ref: RefObject<HTMLElement | null>): Size {
  const [size, setSize] = useState(UNKNOWN);
  useEffect(() => {
    const element = ref.current;
    if (!element) return;
    const observer = new ResizeObserver(([{ contentRect }]) =>
      setSize({ width: contentRect.width, height: contentRect.height }),
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [ref]);
  return size;
}
