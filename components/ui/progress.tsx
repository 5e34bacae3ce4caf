import { formatCount } from './format-quantity';
import { describeTimeLeft } from './time-left';

interface ProgressProps {
  /** what is being done, as a sentence without its full stop */
  label: string;
  done: number;
  total: number;
  /** seconds still to go, null while nobody knows */
  secondsLeft: number | null;
}

/** Long work: how much of it is done and how long it will still take. */
export function Progress({ label, done, total, secondsLeft }: ProgressProps) {
  const left = secondsLeft === null ? '' : `, ${describeTimeLeft(secondsLeft)}`;
  return (
    <div role="status" className="space-y-1">
      <p>{label}</p>
      <progress className="thin-progress" value={done} max={total} aria-label={label} />
      <p className="figures text-sm text-soft">
        {formatCount(done)} of {formatCount(total)}
        {left}
      </p>
    </div>
  );
}
