'use client';

import { useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { CONTROL_STYLE, Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';

/** The token that was just made. It is nowhere else to be read again. */
export function NewToken({ token }: { token: string }) {
  const field = useRef<HTMLInputElement>(null);
  const [copied, setCopied] = useState(false);
  const copy = async () => {
    field.current?.select();
    try {
      await navigator.clipboard.writeText(token);
      setCopied(true);
    } catch {
      setCopied(false); // selected is as far as this browser lets us go
    }
  };
  return (
    <Notice kind="note" title="Here is the token" live>
      <div className="flex items-end gap-4">
        <Field label="Token" className="min-w-0 grow">
          {(tie) => (
            <input
              {...tie}
              ref={field}
              readOnly
              value={token}
              onFocus={(event) => event.currentTarget.select()}
              className={`${CONTROL_STYLE} source-text`}
            />
          )}
        </Field>
        <Button onClick={copy} className="shrink-0">
          {copied ? 'Copied' : 'Copy'}
        </Button>
      </div>
      <p className="text-sm">
        Put it where the script will read it before you leave this page: only a hash of it stays here.
      </p>
      <p className="text-sm text-soft">
        A script sends it as the header <code>Authorization: Bearer ckt_…</code> with each call. Whoever holds
        it may do what was ticked.
      </p>
    </Notice>
  );
}
