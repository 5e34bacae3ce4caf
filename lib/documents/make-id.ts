const LONGEST = 48;
const RESERVED = new Set(Object.getOwnPropertyNames(Object.prototype));

/**
 * An id for something that has a name only: its letters and digits, joined by hyphens.
 *
 * @param taken ids that are in use; the new one is added
 */
export function makeId(name: string, taken: Set<string>): string {
  const plain = name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[^A-Za-z0-9._]+/g, '-')
    .replace(/^[^A-Za-z0-9]+|[^A-Za-z0-9]+$/g, '')
    .slice(0, LONGEST);
  const base = plain === '' || RESERVED.has(plain) ? `x${plain}` : plain;
  let id = base;
  for (let count = 2; taken.has(id); count++) id = `${base}-${count}`;
  taken.add(id);
  return id;
}
