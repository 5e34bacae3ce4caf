import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';

/** Where the checks of meaning say what is wrong: a place as JSON Pointer, and what would be right. */
export type Report = (pointer: string, detail: string) => void;

/** A check of meaning. It looks at lists with `forEach`, which passes over entries that were set aside. */
export type MeaningCheck = (document: DatasetDocument, report: Report) => void;

/** Visits the series of a document, each with the pointer of its place. */
export function eachSeries(document: DatasetDocument, visit: (series: Series, base: string) => void): void {
  document.series.forEach((series, index) => {
    visit(series, `/series/${index}`);
  });
}
