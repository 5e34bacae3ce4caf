import type { Flag } from '@/lib/engine/assessment';

/** The mark of a flag as the plots draw it: a dot, a hollow triangle, a hollow diamond. */
export function FlagMark({ flag }: { flag: Flag }) {
  return (
    <svg viewBox="-7 -7 14 14" aria-hidden="true" className="size-3.5 shrink-0">
      {flag === 'on-curve' ? <circle r={2.6} className="fill-soft" /> : null}
      {flag === 'warning' ? (
        <path d="M0-5 5 4H-5z" className="fill-none stroke-warn" strokeWidth={1.5} />
      ) : null}
      {flag === 'off-curve' ? (
        <path d="M0-5.5 5.5 0 0 5.5-5.5 0z" className="fill-none stroke-off" strokeWidth={1.5} />
      ) : null}
    </svg>
  );
}
