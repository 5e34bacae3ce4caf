/** Words that the sentences of notes are put together from. */

/** A count with its noun: `1 point`, `3 points`. */
export function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}
