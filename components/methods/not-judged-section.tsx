import { MethodsSection } from './methods-section';

/** What a reader must not expect of an assessment today. */
export function NotJudgedSection() {
  return (
    <MethodsSection id="not-judged">
      <p>
        An assessment says which points miss the curve, by how much, and what would bring a series back. It
        does not yet say how laboratories that studied the same system compare.
      </p>
      <p>
        Nor does a named reason prove anything: an offset and a reversed gap, for instance, can move points
        alike, and then both are shown. Whoever made the measurement decides which of them is true.
      </p>
    </MethodsSection>
  );
}
