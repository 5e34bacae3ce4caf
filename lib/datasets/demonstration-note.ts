/**
 * Invented data say so in every file. What is invented is known by the first words of a document's abstract, which
 * travel with it.
 */
const INVENTED = 'Invented for the demonstration';

/** What a file of these data says of them; null where they are not invented. */
export function demonstrationNote(abstract: string): string | null {
  return abstract.startsWith(INVENTED)
    ? `${INVENTED}: no such laboratory, protein or measurement exists.`
    : null;
}
