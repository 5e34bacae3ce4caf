/** The tokens of JSON by jsonc-parser's numbers, which its types keep in an enumeration that vanishes. */
export const JSON_TOKEN = {
  openBrace: 1,
  closeBrace: 2,
  openBracket: 3,
  closeBracket: 4,
  comma: 5,
  colon: 6,
  end: 17,
} as const;
