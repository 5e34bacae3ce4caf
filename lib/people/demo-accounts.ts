/** The accounts of the demonstration, which exist there only. Invented. */
import type { PersonRole } from '@/lib/auth/actor';

export interface DemoAccount {
  email: string;
  name: string;
  role: PersonRole;
  /** what the account is for, in a few words */
  purpose: string;
}

export const DEMO_PASSWORD = 'curvekeep-demo';

export const DEMO_ACCOUNTS: readonly DemoAccount[] = [
  {
    email: 'depositor@demo.example',
    name: 'Dana Depositor',
    role: 'depositor',
    purpose: 'member of a laboratory',
  },
  {
    email: 'manager@demo.example',
    name: 'Maro Manager',
    role: 'depositor',
    purpose: 'manager of a laboratory',
  },
  { email: 'curator@demo.example', name: 'Caro Curator', role: 'curator', purpose: 'decides about deposits' },
  {
    email: 'admin@demo.example',
    name: 'Adan Administrator',
    role: 'administrator',
    purpose: 'looks after roles and laboratories',
  },
];
