/** What is typed for a point's activity: one number, or replicates with space, semicolons or commas between them. */
import { entryText, type JsonObject, listOf, readEntry } from './draft-value';

/** What stands in the cell of a point's activity. */
export function measuredText({ activity, replicates }: JsonObject): string {
  return Array.isArray(replicates) ? replicates.map(entryText).join(' ') : entryText(replicates ?? activity);
}

/** The point with what was typed as its activity, or as its replicates where it is several numbers. */
export function withMeasured(point: JsonObject, text: string): JsonObject {
  const { activity: _, replicates: __, ...others } = point;
  const several = replicatesIn(text);
  if (several !== null) return { ...others, replicates: several };
  const activity = readEntry(text);
  return activity === undefined ? others : { ...others, activity };
}

/** Two or more numbers in a text; null where it is anything else. */
export function replicatesIn(text: string): number[] | null {
  const entries = partsOf(text.trim()).map(readEntry);
  const numbers = entries.filter((entry) => typeof entry === 'number');
  return entries.length > 1 && numbers.length === entries.length ? numbers : null;
}

/** A comma parts numbers where space follows it or where decimal points are written: 0,41 is one number. */
function partsOf(text: string): string[] {
  if (/[\s;]/.test(text)) return text.split(/[\s;]+|,\s+/).map((part) => part.replace(/,$/, ''));
  return text.includes('.') ? text.split(',') : [text];
}

/** Pointers of a point's activity or replicates, with each replicate's own. */
export function measuredPlaces(pointer: string, { replicates }: JsonObject): string[] {
  const each = listOf(replicates).map((_, i) => `${pointer}/replicates/${i}`);
  return [pointer, `${pointer}/activity`, `${pointer}/replicates`, ...each];
}
