/**
 * The quantities of a series that carry a stated uncertainty, each with the column of the scaled gradient
 * that it feeds. A column is ∂f/∂θ·u_θ for one quantity θ: in that scale the covariance of the parameters
 * is their correlation matrix. Quantities of one dataset with the same `sharedAs` label, the stock of a
 * ligand, and the dataset's temperature are one quantity and feed one column.
 */
import { energyStatementToKT, gapToKT } from './convert-statements';
import type { DatasetInput, SeriesInput, TemperatureStatement } from './inputs';

export type QuantityKind =
  | 'gap'
  | 'gapPerSite'
  | 'sites'
  | 'inactive'
  | 'active'
  | 'slope'
  | 'temperature'
  | 'stock';

export interface UncertainQuantity {
  kind: QuantityKind;
  /** index of the site class, or of the modulation entry, or 0 */
  place: number;
  /** index of the ligand in the dataset, or 0 */
  ligand: number;
  /** what the plain derivative is multiplied by: the standard uncertainty, with the sign of the statement */
  scale: number;
  column: number;
}

export interface QuantityTable {
  quantities: UncertainQuantity[];
  /** one entry a column: what the quantity is called across the dataset, null where it is the series' own */
  sharedKeys: (string | null)[];
  /** columns × columns, row by row; null where nothing is correlated */
  correlation: Float64Array | null;
}

/** Collects the uncertain quantities of a series in the order: gap, site classes, slopes, temperature, stocks. */
export function uncertainQuantities(
  dataset: DatasetInput,
  series: SeriesInput,
  temperatureKelvin: number,
  ligandIndex: ReadonlyMap<string, number>,
): QuantityTable {
  const collector = new Collector();
  addParameters(collector, series, temperatureKelvin, ligandIndex);
  addTemperature(collector, dataset.temperature, series.temperature);
  dataset.ligands.forEach((ligand, index) => {
    collector.add('stock', 0, index, ligand.stockRelativeU ?? 0, `stock of ${ligand.id}`);
  });
  return collector.finish(series);
}

function addParameters(
  collector: Collector,
  series: SeriesInput,
  temperatureKelvin: number,
  ligandIndex: ReadonlyMap<string, number>,
): void {
  const { gap, siteClasses, modulation } = series.parameters;
  if (gap) {
    const { uKT, sign } = gapToKT(gap, temperatureKelvin);
    collector.add('gap', 0, 0, sign * uKT, labelOf(gap), 'gap');
  }
  siteClasses.forEach((siteClass, place) => {
    collector.add(
      'sites',
      place,
      0,
      siteClass.sites.u ?? 0,
      labelOf(siteClass.sites),
      `${siteClass.id}/sites`,
    );
    if (siteClass.gapPerSite) {
      const { uKT, sign } = gapToKT(siteClass.gapPerSite, temperatureKelvin);
      collector.add(
        'gapPerSite',
        place,
        0,
        sign * uKT,
        labelOf(siteClass.gapPerSite),
        `${siteClass.id}/gapPerSite`,
      );
    }
    for (const binding of siteClass.binding) {
      const ligand = ligandIndex.get(binding.ligand) ?? 0;
      for (const state of ['inactive', 'active'] as const) {
        const constant = binding[state];
        if (!constant) continue;
        const name = `${siteClass.id}/${binding.ligand}/${state}`;
        collector.add(state, place, ligand, (constant.u ?? 0) / constant.value, labelOf(constant), name);
      }
    }
  });
  modulation?.forEach((entry, place) => {
    const { uKT, sign } = energyStatementToKT(entry.slope, temperatureKelvin);
    collector.add('slope', place, 0, sign * uKT, labelOf(entry.slope), `${entry.modulator}/slope`);
  });
}

function addTemperature(
  collector: Collector,
  ofDataset: TemperatureStatement,
  ofSeries?: TemperatureStatement,
): void {
  const statement = ofSeries ?? ofDataset;
  const key = labelOf(statement) ?? (ofSeries ? null : 'temperature of the dataset');
  collector.add('temperature', 0, 0, statement.u ?? 0, key);
}

/** Labels of depositors live in a namespace of their own, so that none can name a stock by accident. */
function labelOf(statement: { sharedAs?: string }): string | null {
  return statement.sharedAs === undefined ? null : `label ${statement.sharedAs}`;
}

class Collector {
  private readonly quantities: UncertainQuantity[] = [];
  private readonly sharedKeys: (string | null)[] = [];
  private readonly columnOfKey = new Map<string, number>();
  private readonly columnOfName = new Map<string, number>();

  add(
    kind: QuantityKind,
    place: number,
    ligand: number,
    scale: number,
    key: string | null,
    name?: string,
  ): void {
    if (scale === 0) return;
    const column = this.columnFor(key);
    this.quantities.push({ kind, place, ligand, scale, column });
    if (name !== undefined) this.columnOfName.set(name, column);
  }

  finish(series: SeriesInput): QuantityTable {
    return {
      quantities: this.quantities,
      sharedKeys: this.sharedKeys,
      correlation: this.correlation(series),
    };
  }

  private columnFor(key: string | null): number {
    const known = key === null ? undefined : this.columnOfKey.get(key);
    if (known !== undefined) return known;
    const column = this.sharedKeys.push(key) - 1;
    if (key !== null) this.columnOfKey.set(key, column);
    return column;
  }

  private correlation(series: SeriesInput): Float64Array | null {
    const stated = series.parameters.correlations ?? [];
    const n = this.sharedKeys.length;
    const matrix = new Float64Array(n * n);
    for (let i = 0; i < n; i++) matrix[i * n + i] = 1;
    let any = false;
    for (const { a, b, r } of stated) {
      const i = this.columnOfName.get(a);
      const j = this.columnOfName.get(b);
      // A quantity without an uncertainty has no column: its correlation has nothing to act on.
      if (i === undefined || j === undefined || i === j || r === 0) continue;
      matrix[i * n + j] = r;
      matrix[j * n + i] = r;
      any = true;
    }
    return any ? matrix : null;
  }
}
