'use client';

import { usePathname } from 'next/navigation';
import { actionStyle } from '@/components/ui/action-style';
import { Notice } from '@/components/ui/notice';
import { complaintIn } from './call-api';

interface ProblemNoticeProps {
  error: unknown;
  /** whether what was typed outlives a look at another page of this tab */
  isKept?: boolean;
}

/** What went wrong with a call, as the server says it. Nothing where nothing did. */
export function ProblemNotice({ error, isKept = false }: ProblemNoticeProps) {
  if (error === null || error === undefined) return null;
  const { status, title, detail, errors = [] } = complaintIn(error);
  if (status === 401) return <SignedOut isKept={isKept} />;
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

/** The session ended meanwhile. The way back in leads here again; in a new tab where this one holds what was typed. */
function SignedOut({ isKept }: { isKept: boolean }) {
  const next = encodeURIComponent(usePathname() ?? '/');
  return (
    <Notice kind="error" title="You are signed out" live>
      <p>
        {isKept
          ? 'Sign in again; what you typed is kept in this browser tab.'
          : 'Sign in again in another tab, then come back here and repeat it: what you typed stays.'}
      </p>
      <a
        href={`/sign-in?next=${next}`}
        target={isKept ? undefined : '_blank'}
        rel={isKept ? undefined : 'noopener'}
        className={actionStyle()}
      >
        Sign in
      </a>
    </Notice>
  );
}
