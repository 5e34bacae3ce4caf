/** Less than nothing by rounding: pivots and remainders below this count as 0. */
const ROUNDING = 1e-9;
/** Steps of elimination after which a graph counts as too large; a full matrix of 100 needs about as many. */
const MOST_STEPS = 400_000;

type Row = Map<number, number>;

/** A correlation matrix with ones on its diagonal, kept as the few pairs that are not 0. */
export class CorrelationGraph {
  private readonly indices = new Map<string, number>();
  private readonly rows: Row[] = [];

  /** States the correlation of two different quantities. */
  add(a: string, b: string, r: number): void {
    if (r === 0) return;
    const [one, other] = [this.indexOf(a), this.indexOf(b)];
    this.rows[one]?.set(other, r);
    this.rows[other]?.set(one, r);
  }

  /**
   * Whether the matrix is positive semi-definite, by symmetric elimination (LDLᵀ), quantities with the fewest
   * partners first so that it stays sparse. A pivot of 0 must have no partners left.
   *
   * Source: Golub & Van Loan, Matrix Computations, 4th edition, sections 4.2.8 and 11.1.
   */
  canHold(): 'yes' | 'no' | 'too large' {
    const rows = this.rows.map((row) => new Map(row));
    const diagonal = new Float64Array(rows.length).fill(1);
    const left = new Set(rows.keys());
    let steps = 0;
    for (let degree = 1; left.size > 0; degree++) {
      const waiting = [...left];
      steps += waiting.length;
      for (let index = waiting.pop(); index !== undefined; index = waiting.pop()) {
        const row = rows[index] as Row;
        if (!left.has(index) || row.size > degree) continue;
        steps += row.size * row.size;
        if (steps > MOST_STEPS) return 'too large';
        left.delete(index);
        if (!eliminate(index, rows, diagonal)) return 'no';
        waiting.push(...row.keys());
      }
    }
    return 'yes';
  }

  private indexOf(name: string): number {
    const known = this.indices.get(name);
    if (known !== undefined) return known;
    this.indices.set(name, this.rows.length);
    return this.rows.push(new Map()) - 1;
  }
}

/** Takes one quantity out of the matrix; false where that shows it to be impossible. */
function eliminate(index: number, rows: Row[], diagonal: Float64Array): boolean {
  const partners = [...(rows[index] as Row)];
  const pivot = diagonal[index] as number;
  if (pivot < -ROUNDING) return false;
  for (const [partner] of partners) rows[partner]?.delete(index);
  if (pivot <= ROUNDING) return partners.every(([, value]) => value * value <= ROUNDING);
  for (let i = 0; i < partners.length; i++) {
    const [one, value] = partners[i] as [number, number];
    diagonal[one] = (diagonal[one] as number) - (value * value) / pivot;
    for (let j = i + 1; j < partners.length; j++) {
      const [other, otherValue] = partners[j] as [number, number];
      const remaining = (rows[one]?.get(other) ?? 0) - (value * otherValue) / pivot;
      rows[one]?.set(other, remaining);
      rows[other]?.set(one, remaining);
    }
  }
  return true;
}
