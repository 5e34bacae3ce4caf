/**
 * How probable it is that uniform numbers stray at least as far from uniformity as these do: the
 * Kolmogorov–Smirnov test with its asymptotic tail, corrected for a finite number of values.
 *
 * Source: Kolmogorov, Giorn. Ist. Ital. Attuari 4, 83 (1933); the correction √n + 0.12 + 0.11/√n is that of
 * Stephens, J. R. Stat. Soc. B 32, 115 (1970).
 */
export function uniformityPValue(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const n = sorted.length;
  let distance = 0;
  sorted.forEach((value, i) => {
    distance = Math.max(distance, (i + 1) / n - value, value - i / n);
  });
  const lambda = (Math.sqrt(n) + 0.12 + 0.11 / Math.sqrt(n)) * distance;
  return kolmogorovTail(lambda);
}

/** 2 Σ_k (−1)^(k−1) e^(−2k²λ²); below λ = 0.2 it is 1 to twelve digits, where the sum converges slowly. */
export function kolmogorovTail(lambda: number): number {
  if (lambda < 0.2) return 1;
  let sum = 0;
  for (let k = 1; k <= 100; k++) sum += (k % 2 === 1 ? 2 : -2) * Math.exp(-2 * k * k * lambda * lambda);
  return Math.min(1, Math.max(0, sum));
}
