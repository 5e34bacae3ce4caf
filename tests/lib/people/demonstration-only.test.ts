import { afterAll, describe, expect, it } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { selectPersonByEmail } from '@/db/queries/people';
import { loadScenario } from '@/db/seed/load-scenario';
import { deposits } from '@/db/tables/deposits';
import { laboratories } from '@/db/tables/laboratories';
import { people, sessions } from '@/db/tables/people';
import { closeAssessmentPool } from '@/lib/assessments/assessment-pool';
import { actorOfRequest } from '@/lib/auth/current-actor';
import { signIn } from '@/lib/auth/sign-in';
import * as settings from '@/lib/env';
import { createToken } from '@/lib/labs/create-token';
import { DEMO_PASSWORD } from '@/lib/people/demo-accounts';
import { endDemonstrationSessions } from '@/lib/people/demonstration-only';
import { ensureDemoAccounts } from '@/lib/people/ensure-demo-accounts';
import { makeCollection, makeDeposit, makeLab } from '@/tests/support/collection';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();
afterAll(closeAssessmentPool);

/** The settings of the demonstration until the returned function is called. */
function asDemonstration(): () => void {
  settings.env().demo = true;
  return () => {
    settings.env().demo = false;
  };
}

const email = 'manager@demo.example';
const enter = () =>
  signIn({ input: { email, password: DEMO_PASSWORD }, peer: '192.0.2.7', heldSessionId: null });
const actorWith = (headers: Record<string, string>) =>
  actorOfRequest(new Request('http://localhost/', { headers }));

describe('an account of the demonstration', () => {
  it('lets nobody in elsewhere: not by password, session or token', async () => {
    const lab = await makeLab('ambervale');
    const ids = await ensureDemoAccounts([{ email, labId: lab.labId, role: 'manager' }]);
    expect(await enter()).toMatchObject({ ok: false, failure: { code: 'unauthenticated' } });
    const leave = asDemonstration();
    const entered = await enter();
    if (!entered.ok) throw new Error(entered.failure.code);
    const cookie = { cookie: `curvekeep-session=${entered.cookie.value}` };
    const manager = await actorWith(cookie);
    const made = await createToken(manager, lab.labId, { name: 'test', scopes: ['read-drafts'], days: 1 });
    if (!made.ok) throw new Error(made.failure.code);
    const bearer = { authorization: `Bearer ${made.token}` };
    expect(manager).toMatchObject({ kind: 'person', id: ids[email] });
    expect(await actorWith(bearer)).toMatchObject({ kind: 'token' });
    leave();
    expect(await actorWith(cookie)).toEqual({ kind: 'visitor' });
    expect(await actorWith(bearer)).toEqual({ kind: 'visitor' });
    await endDemonstrationSessions();
    expect(await (await readDatabase()).select().from(sessions)).toEqual([]);
  });

  it('comes into no database that holds other people', async () => {
    const database = await readDatabase();
    await makeCollection();
    await write('acknowledged', async (tx) => {
      await tx.delete(people).where(undefined);
    });
    const cast = await makeCollection();
    const before = [await database.select().from(people), await database.select().from(laboratories)];
    await expect(loadScenario()).rejects.toThrow('a folder of its own');
    expect([await database.select().from(people), await database.select().from(laboratories)]).toEqual(
      before,
    );
    expect(await selectPersonByEmail(email)).toBeUndefined();
    await makeDeposit(cast);
    expect(await database.select().from(deposits)).toHaveLength(1);
  });
});
