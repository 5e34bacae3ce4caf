import { useSyncExternalStore } from 'react';

/** The page's tokens as a canvas needs them. */
export interface PlotColours {
  ground: string;
  ink: string;
  soft: string;
  hairline: string;
  wash: string;
  act: string;
  off: string;
  warn: string;
  series: string[];
  font: string;
}

let cached: PlotColours | null = null;

function readColours(): PlotColours {
  const style = getComputedStyle(document.documentElement);
  const token = (name: string) => style.getPropertyValue(`--${name}`).trim();
  return {
    ground: token('ground'),
    ink: token('ink'),
    soft: token('soft'),
    hairline: token('hairline'),
    wash: token('wash'),
    act: token('act'),
    off: token('off'),
    warn: token('warn'),
    series: [1, 2, 3, 4, 5, 6].map((k) => token(`series-${k}`)),
    font: getComputedStyle(document.body).fontFamily,
  };
}

function snapshot(): PlotColours {
  cached ??= readColours();
  return cached;
}

/** Tells of a change of theme: by the system, or by the reader (an attribute of the root element). */
function subscribe(changed: () => void): () => void {
  const refresh = () => {
    cached = null;
    changed();
  };
  const dark = matchMedia('(prefers-color-scheme: dark)');
  const observer = new MutationObserver(refresh);
  dark.addEventListener('change', refresh);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
  return () => {
    dark.removeEventListener('change', refresh);
    observer.disconnect();
  };
}

/** The colours of the current theme; to be used where there is a document. */
export function usePlotColours(): PlotColours {
  return useSyncExternalStore(subscribe, snapshot);
}
