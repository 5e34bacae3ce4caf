/** Small steps that several readings of a series share. */
import type { CorrelationInput, ParametersInput, SeriesInput } from './inputs';
import { MOST_CORRELATIONS } from './stated-ranges';

/** The series with other parameters; all else passes through. */
export function withParameters<S extends SeriesInput>(series: S, changes: Partial<ParametersInput>): S {
  return { ...series, parameters: { ...series.parameters, ...changes } };
}

/**
 * Correlations under the new names of their quantities, for a spread into parameters.
 *
 * @param rename the new names of one quantity; a quantity that has become several, which are one and the same,
 *   hands its correlation to each of them
 * @returns null where they would be more than a series may state
 */
export function renameCorrelations(
  { correlations }: ParametersInput,
  rename: (name: string) => readonly string[],
): Pick<ParametersInput, 'correlations'> | null {
  if (correlations === undefined) return {};
  const renamed: CorrelationInput[] = correlations.flatMap((one) =>
    rename(one.a).flatMap((a) => rename(one.b).map((b) => ({ ...one, a, b }))),
  );
  return renamed.length > MOST_CORRELATIONS ? null : { correlations: renamed };
}
