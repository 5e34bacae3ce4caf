/** Reads a curator's decision from the body of a call. */
import type { z } from 'zod';
import { readDatabase } from '@/db/client';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { invalidInput } from '@/lib/auth/input-errors';
import { auditSubject, reachDeposit } from '@/lib/deposits/reach-deposit';
import { failed, type Outcome } from '@/lib/errors';
import type { BodyResult } from '@/lib/serving/read-body';
import { decisionSchema } from '@/schemas/decision';

interface DecisionBody {
  actor: Actor;
  id: string;
  readBody: () => Promise<BodyResult>;
}

type ReadDecision = Outcome<z.infer<typeof decisionSchema>>;

/** The decision in a body, which is read only where the actor may decide on the deposit. */
export function readDecision(call: DecisionBody): Promise<ReadDecision> {
  const refusal = { actor: call.actor, action: 'decide-deposit', subject: auditSubject(call.id) } as const;
  return auditingRefusals(refusal, async (): Promise<ReadDecision> => {
    const reached = await reachDeposit(await readDatabase(), call.actor, 'decide-deposit', call.id);
    if (!reached.ok) return reached;
    const body = await call.readBody();
    return body.ok ? parse(body.bytes) : body;
  });
}

function parse(bytes: Uint8Array): ReadDecision {
  let value: unknown;
  try {
    value = JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    return failed('malformed-json', 'The body must be a JSON object with kind and letter.');
  }
  const parsed = decisionSchema.safeParse(value);
  return parsed.success ? { ok: true, ...parsed.data } : { ok: false, failure: invalidInput(parsed.error) };
}
