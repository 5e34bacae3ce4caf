/** JSON Pointers (RFC 6901): the names of places in a document. */

/** The pointer of a member of the place at `base`. */
export function pointerTo(base: string, ...members: (string | number)[]): string {
  return members.reduce<string>((pointer, member) => `${pointer}/${escapeMember(member)}`, base);
}

function escapeMember(member: string | number): string | number {
  if (typeof member === 'number') return member;
  return member.replaceAll('~', '~0').replaceAll('/', '~1');
}

/** The members that a pointer names, outermost first; none for the whole document. */
export function membersOf(pointer: string): string[] {
  if (pointer === '') return [];
  return pointer
    .slice(1)
    .split('/')
    .map((member) => member.replaceAll('~1', '/').replaceAll('~0', '~'));
}
