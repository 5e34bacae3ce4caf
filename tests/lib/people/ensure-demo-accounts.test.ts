import { describe, expect, it } from 'vitest';
import { selectMembers } from '@/db/queries/laboratories';
import { selectMemberships, selectPerson } from '@/db/queries/people';
import { isPassword } from '@/lib/auth/password';
import { ensureDemoAccounts, ensureLaboratory, ensurePerson } from '@/lib/people/ensure-demo-accounts';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

describe('the accounts of the demonstration', () => {
  it('are there once, however often they are made', async () => {
    const lab = { slug: 'ambervale', name: 'Ambervale', institution: 'Invented Institute' };
    const labId = await ensureLaboratory(lab);
    const places = [
      { email: 'depositor@demo.example', labId, role: 'member' },
      { email: 'manager@demo.example', labId, role: 'manager' },
    ] as const;
    const ids = await ensureDemoAccounts(places);
    expect(await ensureLaboratory({ ...lab, name: 'Ambervale Group' })).toBe(labId);
    expect(await ensureDemoAccounts(places)).toEqual(ids);
    expect(Object.keys(ids)).toEqual([
      'depositor@demo.example',
      'manager@demo.example',
      'curator@demo.example',
      'admin@demo.example',
    ]);
    expect((await selectMembers(labId)).map(({ email, role }) => [email, role])).toEqual([
      ['manager@demo.example', 'manager'],
      ['depositor@demo.example', 'member'],
    ]);
    const depositor = ids['depositor@demo.example'] ?? '';
    expect(await selectMemberships(depositor)).toEqual([
      { labId, labSlug: 'ambervale', labName: 'Ambervale Group', role: 'member' },
    ]);
  });

  it('sign in with the password that is told, and with the roles of their names', async () => {
    const ids = await ensureDemoAccounts([]);
    for (const [email, role] of [
      ['depositor@demo.example', 'depositor'],
      ['manager@demo.example', 'depositor'],
      ['curator@demo.example', 'curator'],
      ['admin@demo.example', 'administrator'],
    ] as const) {
      const row = await selectPerson(ids[email] ?? '');
      expect(row?.role).toBe(role);
      expect(await isPassword('curvekeep-demo', row?.passwordHash)).toBe(true);
    }
  });

  it('a password has 8 to 128 characters', async () => {
    const someone = { email: 'some@demo.example', name: 'S. Example', role: 'depositor' } as const;
    await expect(ensurePerson({ ...someone, password: 'seven 7' })).rejects.toThrow('at least 8');
    await expect(ensurePerson({ ...someone, password: 'x'.repeat(129) })).rejects.toThrow('at most 128');
    expect(await ensurePerson({ ...someone, password: 'x'.repeat(128) })).toMatch(/^[A-Za-z0-9_-]{22}$/);
  });

  it('a person made again has the new password and role, the same id', async () => {
    const before = {
      email: ' New@Demo.example',
      name: 'N. Example',
      password: 'first password',
      role: 'depositor',
    } as const;
    const id = await ensurePerson(before);
    expect(await ensurePerson({ ...before, password: 'second password', role: 'curator' })).toBe(id);
    const row = await selectPerson(id);
    expect(row).toMatchObject({ email: 'new@demo.example', role: 'curator' });
    expect(await isPassword('second password', row?.passwordHash)).toBe(true);
    expect(await isPassword('first password', row?.passwordHash)).toBe(false);
  });
});
