import { Button } from '@/components/ui/button';
import { formatCount } from '@/components/ui/format-quantity';
import { Notice } from '@/components/ui/notice';
import type { SourceProblem } from './read-source';

interface ProblemListProps {
  problems: readonly SourceProblem[];
  text: string;
  onLine: (line: number, column: number | null) => void;
}

const MOST_SHOWN = 100;
const LONGEST_EXCERPT = 60;

/** All that is wrong, each with what would be right, what stands there, and the way to its line. */
export function ProblemList({ problems, text, onLine }: ProblemListProps) {
  const lines = text.split('\n');
  const title =
    problems.length === 1 ? 'One thing to mend' : `${formatCount(problems.length)} things to mend`;
  return (
    <Notice kind="error" title={title} live>
      <ol className="thin-scroll max-h-[34rem] space-y-3 overflow-y-auto">
        {inOrder(problems)
          .slice(0, MOST_SHOWN)
          .map((problem) => (
            <li
              key={`${problem.line} ${problem.column} ${problem.pointer} ${problem.detail}`}
              className="border-hairline border-b pb-2.5"
            >
              <p>{sentence(problem.detail)}</p>
              <Place problem={problem} excerpt={excerptOf(lines, problem)} onLine={onLine} />
            </li>
          ))}
      </ol>
      {problems.length > MOST_SHOWN ? (
        <p className="text-sm text-soft">
          and {formatCount(problems.length - MOST_SHOWN)} more; mend the first ones and assess again.
        </p>
      ) : null}
    </Notice>
  );
}

/** From the top of the text down; what has no line comes first. */
function inOrder(problems: readonly SourceProblem[]): SourceProblem[] {
  return [...problems].sort((a, b) => (a.line ?? 0) - (b.line ?? 0) || (a.column ?? 0) - (b.column ?? 0));
}

/** With a capital, unless it begins with the reader's own words in quotation marks. */
function sentence(detail: string): string {
  return /^[a-z]/.test(detail) ? detail.charAt(0).toUpperCase() + detail.slice(1) : detail;
}

interface PlaceProps {
  problem: SourceProblem;
  excerpt: string | null;
  onLine: (line: number, column: number | null) => void;
}

function Place({ problem: { line, column, pointer }, excerpt, onLine }: PlaceProps) {
  return (
    <>
      {excerpt ? <p className="source-text mt-0.5 truncate text-soft">{excerpt}</p> : null}
      <p className="flex flex-wrap items-baseline gap-x-3">
        {line === null ? null : (
          <Button className="figures text-sm" onClick={() => onLine(line, column)}>
            Go to line {line}
          </Button>
        )}
        {pointer ? <code className="break-all font-sans text-soft text-xs">{pointer}</code> : null}
      </p>
    </>
  );
}

function excerptOf(lines: readonly string[], { line, column }: SourceProblem): string | null {
  const text = line === null ? undefined : lines[line - 1];
  // A bare brace tells nothing.
  if (text === undefined || !/[\w"]/.test(text)) return null;
  const from = Math.max(0, (column ?? 1) - 1 - LONGEST_EXCERPT / 2);
  return text.length <= LONGEST_EXCERPT
    ? text.trim()
    : `…${text.slice(from, from + LONGEST_EXCERPT).trim()}…`;
}
