import type { MeaningCheck } from './document-report';

/** Each contributor's ORCID iD ends in the check character that its digits ask for. */
export const checkOrcids: MeaningCheck = (document, report) => {
  document.contributors.forEach(({ orcid }, index) => {
    if (orcid === undefined) return;
    const digits = orcid.replaceAll('-', '');
    const right = orcidCheckCharacter(digits.slice(0, -1));
    if (digits.endsWith(right)) return;
    const detail = `the check character of orcid ${orcid} should be ${right}; please look for a mistyped digit`;
    report(`/contributors/${index}/orcid`, detail);
  });
};

/**
 * The check character of an ORCID iD, ISO 7064 MOD 11-2.
 *
 * @param digits the first fifteen digits, without hyphens
 * @returns a digit, or X for ten
 *
 * Source: ORCID, “Structure of the ORCID Identifier” (support.orcid.org).
 */
export function orcidCheckCharacter(digits: string): string {
  const total = [...digits].reduce((sum, digit) => ((sum + Number(digit)) * 2) % 11, 0);
  const check = (12 - total) % 11;
  return check === 10 ? 'X' : String(check);
}
