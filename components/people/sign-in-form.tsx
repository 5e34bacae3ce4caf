'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { CONTROL_STYLE, Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import type { SignInState } from './sign-in-state';

interface SignInFormProps {
  action: (previous: SignInState, form: FormData) => Promise<SignInState>;
  /** where to go afterwards */
  next: string;
  /** what stands in the fields at first: the demonstration fills them */
  email?: string;
  password?: string;
}

/** E-mail address and password. Works before any script has run. */
export function SignInForm({ action, next, email = '', password }: SignInFormProps) {
  const [state, send, pending] = useActionState(action, { email, message: null, errors: {} });
  return (
    <form action={send} noValidate className="max-w-[24rem] space-y-5">
      {state.message ? (
        <Notice kind="error" title="Not signed in" live>
          <p>{state.message}</p>
        </Notice>
      ) : null}
      <input type="hidden" name="next" value={next} />
      <Field label="E-mail address" error={state.errors.email}>
        {(tie) => (
          <input
            {...tie}
            key={state.email}
            type="email"
            name="email"
            autoComplete="username"
            autoCapitalize="none"
            spellCheck={false}
            required
            defaultValue={state.email}
            className={CONTROL_STYLE}
          />
        )}
      </Field>
      <Field label="Password" error={state.errors.password}>
        {(tie) => (
          <input
            {...tie}
            type="password"
            name="password"
            autoComplete="current-password"
            required
            defaultValue={password}
            className={CONTROL_STYLE}
          />
        )}
      </Field>
      <Button type="submit" variant="primary" aria-disabled={pending}>
        {pending ? 'Signing in …' : 'Sign in'}
      </Button>
    </form>
  );
}
