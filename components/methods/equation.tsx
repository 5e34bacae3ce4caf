import { mathmlElements } from './mathml-elements';

interface EquationProps {
  /** TeX; written as MathML on the server. `\\qquad` parts equations that may stand below one another */
  tex: string;
  /** what the equation states, heading its line for those who listen or skim */
  says?: string;
}

/** Equations on a line of their own; one too long for a narrow screen scrolls by itself. */
export function Equation({ tex, says }: EquationProps) {
  return (
    <figure className="mt-4 max-w-[46rem] py-1">
      {says ? <figcaption className="font-sans text-sm text-soft">{says}</figcaption> : null}
      <div
        // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
        tabIndex={0}
        className="flex flex-wrap items-center gap-x-10 gap-y-3 overflow-x-auto overflow-y-hidden py-2 sm:pl-7"
      >
        {tex.split('\\qquad').map((part) => (
          <div key={part}>{mathmlElements(part, true)}</div>
        ))}
      </div>
    </figure>
  );
}

/** An equation in running text. */
export function InlineEquation({ tex }: { tex: string }) {
  return mathmlElements(tex, false);
}
