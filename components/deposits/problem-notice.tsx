import { Notice } from '@/components/ui/notice';
import { complaintIn } from './call-api';

/** What went wrong with a call, as the server says it. Nothing where nothing did. */
export function ProblemNotice({ error }: { error: unknown }) {
  if (error === null || error === undefined) return null;
  const { title, detail, errors = [] } = complaintIn(error);
  return (
    <Notice kind="error" title={title} live>
      <p>{detail}</p>
      {errors.slice(0, 5).map((one) => (
        <p key={`${one.pointer} ${one.detail}`} className="text-sm">
          {one.detail} <span className="break-all text-soft text-xs">{one.pointer}</span>
        </p>
      ))}
    </Notice>
  );
}
