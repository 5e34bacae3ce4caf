import { createScanner } from 'jsonc-parser';
import type { TextPlace } from './find-syntax-error';
import { membersOf } from './json-pointer';
import { JSON_TOKEN } from './json-tokens';

/**
 * Where the places of a document stand in its JSON text.
 *
 * The text is read once, whatever the number of pointers, and without recursion.
 *
 * @param text JSON, as it was given (a byte order mark counts as no column)
 * @param pointers JSON Pointers (RFC 6901)
 * @returns by pointer: the place of a member's name or of an entry's first character; where a pointer names
 * something that is missing, the place of the nearest thing around it that exists
 */
export function locatePointers(text: string, pointers: Iterable<string>): Map<string, TextPlace> {
  const root: Wanted = { members: new Map() };
  const wanted = new Map<string, Wanted[]>();
  for (const pointer of pointers) wanted.set(pointer, wantedPath(root, membersOf(pointer)));
  markPlaces(text.replace(/^\uFEFF/, ''), root);
  const places = new Map<string, TextPlace>();
  for (const [pointer, path] of wanted) {
    const found = path.findLast(({ place }) => place !== undefined);
    places.set(pointer, found?.place ?? { line: 1, column: 1 });
  }
  return places;
}

/** As `locatePointers`, for one pointer. */
export function locatePointer(text: string, pointer: string): TextPlace {
  return locatePointers(text, [pointer]).get(pointer) ?? { line: 1, column: 1 };
}

/** A place that a pointer names or passes. */
interface Wanted {
  place?: TextPlace;
  members: Map<string, Wanted>;
}

function wantedPath(root: Wanted, members: string[]): Wanted[] {
  const path = [root];
  let node = root;
  for (const member of members) {
    const next: Wanted = node.members.get(member) ?? { members: new Map() };
    node.members.set(member, next);
    path.push(next);
    node = next;
  }
  return path;
}

/** A list or object that the reading is within. */
interface Enclosing {
  wanted: Wanted | undefined;
  /** index of the current entry; -1 in an object */
  index: number;
  /** name of the current member, and where it stands */
  name: string | null;
  namePlace: TextPlace | null;
}

function markPlaces(text: string, root: Wanted): void {
  const scanner = createScanner(text, true);
  const stack: Enclosing[] = [];
  for (let token: number = scanner.scan(); token !== JSON_TOKEN.end; token = scanner.scan()) {
    const inside = stack.at(-1);
    const here = { line: scanner.getTokenStartLine() + 1, column: scanner.getTokenStartCharacter() + 1 };
    if (token === JSON_TOKEN.closeBrace || token === JSON_TOKEN.closeBracket) stack.pop();
    else if (token === JSON_TOKEN.comma) passComma(inside);
    else if (token !== JSON_TOKEN.colon) {
      if (inside !== undefined && inside.index < 0 && inside.name === null) {
        inside.name = scanner.getTokenValue();
        inside.namePlace = here;
        continue;
      }
      const value = markValue(inside, root, here);
      if (token === JSON_TOKEN.openBrace)
        stack.push({ wanted: value, index: -1, name: null, namePlace: null });
      if (token === JSON_TOKEN.openBracket)
        stack.push({ wanted: value, index: 0, name: null, namePlace: null });
    }
  }
}

function passComma(inside: Enclosing | undefined): void {
  if (inside === undefined) return;
  if (inside.index < 0) inside.name = null;
  else inside.index += 1;
}

/** Notes where a value stands, if a pointer asks for it. */
function markValue(inside: Enclosing | undefined, root: Wanted, here: TextPlace): Wanted | undefined {
  const member = inside?.name ?? String(inside?.index);
  const value = inside === undefined ? root : inside.wanted?.members.get(member);
  if (value !== undefined) value.place = inside?.namePlace ?? here;
  return value;
}
