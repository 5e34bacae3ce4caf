/** The laboratories that a person sees from within: their own; of an administrator, all. */
import {
  type LaboratoryRow,
  type MemberRow,
  selectLaboratories,
  selectMembers,
} from '@/db/queries/laboratories';
import type { Actor } from '@/lib/auth/actor';
import { decide, may } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import type { Failure } from '@/lib/errors';
import { type ListedToken, listTokens } from './list-tokens';

export interface OwnLab {
  id: string;
  slug: string;
  name: string;
  institution: string;
  members: MemberRow[];
  /** null where the person may not manage them */
  tokens: ListedToken[] | null;
}

export type ListOwnLabsOutcome = { ok: true; labs: OwnLab[] } | { ok: false; failure: Failure };

/** Each with its members, and with its tokens where the person may manage them; by name. */
export async function listOwnLabs(actor: Actor): Promise<ListOwnLabsOutcome> {
  const decision = decide(actor, 'see-lab');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const rows = await selectLaboratories();
  const own = rows.filter(({ id }) => may(actor, 'see-lab', { labId: id }));
  return { ok: true, labs: await Promise.all(own.map((row) => ownLab(actor, row))) };
}

async function ownLab(actor: Actor, { id, slug, name, institution }: LaboratoryRow): Promise<OwnLab> {
  const [members, listed] = await Promise.all([selectMembers(id), listTokens(actor, id)]);
  return { id, slug, name, institution, members, tokens: listed.ok ? listed.tokens : null };
}
