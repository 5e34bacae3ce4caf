import { Button } from '@/components/ui/button';

interface DemoAccountListProps {
  accounts: readonly { email: string; purpose: string }[];
  password: string;
  /** where to go after signing in */
  next: string;
}

/** The accounts of the demonstration; a button puts one into the form. A plain GET, so that it needs no script. */
export function DemoAccountList({ accounts, password, next }: DemoAccountListProps) {
  return (
    <section aria-labelledby="demo-accounts">
      <h2 id="demo-accounts" className="font-semibold">
        Accounts of this demonstration
      </h2>
      <p className="mt-1 text-sm text-soft">
        Invented people. The password of all four is <code className="text-ink">{password}</code>. Choose one
        to fill the form.
      </p>
      <form action="/sign-in" method="get" className="mt-3">
        {next === '/' ? null : <input type="hidden" name="next" value={next} />}
        <ul>
          {accounts.map(({ email, purpose }) => (
            <li key={email} className="border-hairline border-t py-2">
              <Button type="submit" name="as" value={email} className="break-all text-sm">
                {email}
              </Button>
              <p className="text-soft text-xs">{purpose}</p>
            </li>
          ))}
        </ul>
      </form>
    </section>
  );
}
