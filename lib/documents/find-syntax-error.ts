import { createScanner, type ParseErrorCode, visit } from 'jsonc-parser';
import { JSON_TOKEN } from './json-tokens';

/** A place in a text, line and column counted from 1. */
export interface TextPlace {
  line: number;
  column: number;
}

export interface SyntaxProblem extends TextPlace {
  detail: string;
}

/** Deeper than any document; the parser that finds the place of an error works by recursion. */
const DEEPEST = 500;

/** Where a text that is no JSON goes wrong first, and what would be right there. */
export function findSyntaxError(text: string): SyntaxProblem {
  if (text.trim() === '')
    return { line: 1, column: 1, detail: 'the text is empty; a dataset document must stand here' };
  return findDeepNesting(text) ?? findFirstError(text) ?? { line: 1, column: 1, detail: 'this is not JSON' };
}

function findDeepNesting(text: string): SyntaxProblem | null {
  const scanner = createScanner(text, true);
  let depth = 0;
  for (let token: number = scanner.scan(); token !== JSON_TOKEN.end; token = scanner.scan()) {
    if (token === JSON_TOKEN.openBrace || token === JSON_TOKEN.openBracket) depth += 1;
    if (token === JSON_TOKEN.closeBrace || token === JSON_TOKEN.closeBracket) depth -= 1;
    if (depth > DEEPEST)
      return {
        line: scanner.getTokenStartLine() + 1,
        column: scanner.getTokenStartCharacter() + 1,
        detail: `lists and objects stand within each other more than ${DEEPEST} deep; a dataset document needs about ten`,
      };
  }
  return null;
}

function findFirstError(text: string): SyntaxProblem | null {
  let first: SyntaxProblem | null = null;
  visit(
    text,
    {
      onError(code, offset, _length, line, character) {
        const detail = isDecimalComma(text, offset) ? DECIMAL_COMMA : RIGHT[code];
        first ??= { line: line + 1, column: character + 1, detail };
      },
    },
    { disallowComments: true, allowTrailingComma: false, allowEmptyContent: false },
  );
  return first;
}

/** By jsonc-parser's codes, in their order from 1. */
const RIGHT: Record<ParseErrorCode, string> = {
  1: 'only text in double quotes, a number such as 0.42, true, false, null, a list or an object may stand here',
  2: 'a number must be written like 12.5 or 1e-3',
  3: 'the name of a property must stand here, in double quotes; after the last property there is no comma',
  4: 'a value must stand here; after the last entry of a list there is no comma',
  5: 'a colon must stand between the name of a property and its value',
  6: 'a comma must stand here',
  7: 'the object must be closed by }',
  8: 'the list must be closed by ]',
  9: 'the text must end after the closing } of the document',
  10: 'JSON takes no comments',
  11: 'JSON takes no comments',
  12: 'the text must be closed by a double quote on the same line',
  13: 'a number must be written like 12.5 or 1e-3',
  14: '\\u must be followed by four hexadecimal digits',
  15: 'a backslash must be followed by one of " \\ / b f n r t u',
  16: 'a line break, tab or control character within a text must be written as \\n, \\t or \\u and four digits',
};

const DECIMAL_COMMA = 'a number takes a decimal point, not a comma: 0.15';

/** Whether the place stands right behind a comma between two digits. */
function isDecimalComma(text: string, offset: number): boolean {
  return /\d,$/.test(text.slice(Math.max(0, offset - 2), offset)) && /\d/.test(text.charAt(offset));
}
