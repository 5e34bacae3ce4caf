import type { Actor } from '@/lib/auth/actor';
import { listSystems } from '@/lib/systems/list-systems';
import { MOST_LIMIT } from '@/schemas/dataset-query';

/** The listed systems, all pages of them: slugs with their names. */
export async function systemChoices(actor: Actor): Promise<{ value: string; label: string }[]> {
  const choices: { value: string; label: string }[] = [];
  let cursor: string | null = null;
  do {
    const listed: Awaited<ReturnType<typeof listSystems>> = await listSystems(actor, {
      limit: MOST_LIMIT,
      cursor,
    });
    if (!listed.ok) return choices;
    const { systems, next } = listed.list;
    choices.push(...systems.map(({ slug, name }) => ({ value: slug, label: name })));
    cursor = next === null ? null : new URL(next, 'http://localhost').searchParams.get('cursor');
  } while (cursor !== null);
  return choices;
}

/** What a slug is called; the slug itself where no system of it is listed. */
export async function systemNames(actor: Actor): Promise<(slug: string) => string> {
  const names = new Map((await systemChoices(actor)).map(({ value, label }) => [value, label]));
  return (slug) => names.get(slug) ?? slug;
}
