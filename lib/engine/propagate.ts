/**
 * Propagation of distributions by the Monte Carlo method, whatever the model: the mean and the standard
 * deviation of every output over independent trials.
 *
 * Source: JCGM 101:2008, 7.
 */

export interface Moments {
  mean: Float64Array;
  /** sample standard deviation, with trials − 1 */
  deviation: Float64Array;
}

/**
 * @param trials number of trials, at least 2
 * @param outputs number of output quantities
 * @param runTrial draws the inputs of one trial and writes its outputs
 */
export function propagate(
  trials: number,
  outputs: number,
  runTrial: (out: Float64Array, trial: number) => void,
): Moments {
  const mean = new Float64Array(outputs);
  const squares = new Float64Array(outputs);
  const out = new Float64Array(outputs);
  for (let trial = 0; trial < trials; trial++) {
    runTrial(out, trial);
    // Welford's update: a small spread about a large mean keeps its digits.
    for (let i = 0; i < outputs; i++) {
      const difference = out[i] - mean[i];
      mean[i] += difference / (trial + 1);
      squares[i] += difference * (out[i] - mean[i]);
    }
  }
  return { mean, deviation: squares.map((sum) => Math.sqrt(sum / (trials - 1))) };
}
