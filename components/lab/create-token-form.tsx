'use client';

import { useActionState, useId } from 'react';
import { Button } from '@/components/ui/button';
import { CONTROL_STYLE, Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { SelectField } from '@/components/ui/select-field';
import { NewToken } from './new-token';
import { SCOPE_WORDS, TOKEN_LIVES } from './scope-words';
import { type CreateTokenState, FIRST_TOKEN_STATE } from './token-state';

interface CreateTokenFormProps {
  labId: string;
  /** the main action of its page */
  primary: boolean;
  action: (previous: CreateTokenState, form: FormData) => Promise<CreateTokenState>;
}

/** Name, scopes and life of a new token; then the token, once. */
export function CreateTokenForm({ labId, primary, action }: CreateTokenFormProps) {
  const [{ answer, token, message, errors, typed }, send, pending] = useActionState(
    action,
    FIRST_TOKEN_STATE,
  );
  return (
    <div className="space-y-5">
      {token ? <NewToken key={answer} token={token} /> : null}
      {message ? (
        <Notice kind="error" title="No token was made" live>
          {message}
        </Notice>
      ) : null}
      <form action={send} noValidate className="space-y-5">
        <input type="hidden" name="labId" value={labId} />
        {/* New fields with every answer: a form that was sent empties the old ones. */}
        <div key={answer} className="grid gap-x-8 gap-y-5 sm:grid-cols-[minmax(0,1fr)_9rem]">
          <Field label="Name" hint="the script or machine that will use it" error={errors.name}>
            {(tie) => (
              <input
                {...tie}
                type="text"
                name="name"
                autoComplete="off"
                maxLength={80}
                defaultValue={typed.name}
                className={CONTROL_STYLE}
              />
            )}
          </Field>
          <SelectField
            label="Ends after"
            name="days"
            options={TOKEN_LIVES}
            error={errors.days}
            defaultValue={typed.days}
          />
          <ScopeBoxes chosen={typed.scopes} error={errors.scopes} />
        </div>
        <Button type="submit" variant={primary ? 'primary' : 'text'} aria-disabled={pending}>
          {pending ? 'Making …' : 'Make a token'}
        </Button>
      </form>
    </div>
  );
}

function ScopeBoxes({ chosen, error }: { chosen: readonly string[]; error?: string }) {
  const id = useId();
  return (
    <fieldset className="sm:col-span-2" aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="text-sm text-soft">It may</legend>
      <div className="mt-1 flex flex-wrap gap-x-7 gap-y-1">
        {Object.entries(SCOPE_WORDS).map(([scope, words]) => (
          <label key={scope} className="inline-flex min-h-6 items-center gap-2">
            <input
              type="checkbox"
              name="scopes"
              value={scope}
              defaultChecked={chosen.includes(scope)}
              className="size-4 accent-[var(--act)]"
            />
            {words}
          </label>
        ))}
      </div>
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-off text-xs">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
