/**
 * Benjamini–Hochberg adjustment: q_(i) = min over j ≥ i of N·p_(j)/j, at most 1, in the order given.
 *
 * Source: Benjamini & Hochberg, J. R. Statist. Soc. B 57, 289 (1995).
 *
 * @param pValues N numbers in [0, 1]
 * @returns N adjusted numbers, same order
 */
export function adjustPValues(pValues: Float64Array): Float64Array {
  const count = pValues.length;
  // A typed array sorts by number natively; ranks are found again by the value, ties sharing one q.
  const sorted = Float64Array.from(pValues).sort();
  const qOfRank = new Float64Array(count);
  let smallest = 1;
  for (let i = count - 1; i >= 0; i--) {
    smallest = Math.min(smallest, (sorted[i] * count) / (i + 1));
    qOfRank[i] = smallest;
  }
  const adjusted = new Float64Array(count);
  for (let i = 0; i < count; i++) adjusted[i] = qOfRank[firstIndexOf(sorted, pValues[i])];
  return adjusted;
}

/** Lowest index of `value` in an ascending array that holds it. */
function firstIndexOf(sorted: Float64Array, value: number): number {
  let low = 0;
  let high = sorted.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted[middle] < value) low = middle + 1;
    else high = middle;
  }
  return low;
}
