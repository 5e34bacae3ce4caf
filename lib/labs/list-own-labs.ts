/** The laboratories that a person sees from within: their own; of an administrator, all. */
import {
  type LaboratoryRow,
  type MemberRow,
  selectLaboratories,
  selectMembers,
} from '@/db/queries/laboratories';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { refusalOf } from '@/lib/auth/refusal';
import type { Outcome } from '@/lib/errors';
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

/** Each with its members, and with its tokens where the person may manage them; by name. */
export function listOwnLabs(actor: Actor): Promise<Outcome<{ labs: OwnLab[] }>> {
  return auditingRefusals({ actor, action: 'see-lab', subject: 'laboratories:' }, async () => {
    const refused = refusalOf(actor, 'see-lab');
    if (refused !== null) return refused;
    const rows = await selectLaboratories();
    const own = rows.filter(({ id }) => may(actor, 'see-lab', { labId: id }));
    return { ok: true, labs: await Promise.all(own.map((row) => ownLab(actor, row))) };
  });
}

async function ownLab(actor: Actor, { id, slug, name, institution }: LaboratoryRow): Promise<OwnLab> {
  const manages = may(actor, 'manage-tokens', { labId: id });
  const [members, listed] = await Promise.all([selectMembers(id), manages ? listTokens(actor, id) : null]);
  return { id, slug, name, institution, members, tokens: listed?.ok ? listed.tokens : null };
}
