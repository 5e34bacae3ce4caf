/** The mark: a master curve with one point that misses it, on its stem. */
export function Mark({ className }: { className?: string }) {
  return (
    <svg viewBox="0 0 24 24" fill="none" aria-hidden="true" className={className}>
      <path d="M1.5 20.5h21" stroke="currentColor" strokeWidth="1" opacity="0.55" />
      <path d="M1.5 17.2C10.2 17.2 8.6 4.4 22.5 4" stroke="currentColor" strokeWidth="1.6" />
      <path d="M15.6 5.6v7.2" className="stroke-off" strokeWidth="1.4" />
      <path d="M15.6 12.2l2.3 2.3-2.3 2.3-2.3-2.3z" className="fill-off" />
    </svg>
  );
}
