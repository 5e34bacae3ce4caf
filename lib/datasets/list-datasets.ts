/** Published datasets under some filters, the newest first, with what the page beside them counts. */
import type { Selection } from '@/db/queries/dataset-selection';
import {
  type DatasetHead,
  type DatasetPlace,
  selectDatasetPage,
  selectFacet,
  selectFacetNames,
  selectFlagFacet,
  selectStripColumns,
  selectTotals,
  selectWindowCounts,
} from '@/db/queries/datasets';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import { failed, type Outcome } from '@/lib/errors';
import type { DatasetItem, DatasetList, Facets, PointCounts } from '@/schemas/dataset-answers';
import { type DatasetQuery, POINT_FLAGS, USUAL_LIMIT } from '@/schemas/dataset-query';
import { formatAccession } from './accession';
import { countedWindow, countsOf, filterParameters, selectionOf } from './dataset-filter';
import { drawStrip } from './draw-strip';
import { BAD_CURSOR, decodeCursor, encodeCursor, nextAddress } from './list-cursor';

const FLAG_WORDS = { 'on-curve': 'on the curve', warning: 'with warnings', 'off-curve': 'off the curve' };

/** One page of the list. `bad-parameter` where the cursor is none of this list. */
export async function listDatasets(
  actor: Actor,
  query: DatasetQuery,
): Promise<Outcome<{ list: DatasetList }>> {
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const { limit, cursor, ...filters } = query;
  const after = cursor === null ? null : placeOf(cursor);
  if (cursor !== null && after === null) return failed('bad-parameter', BAD_CURSOR);
  const selection = selectionOf(filters);
  const rows = await selectDatasetPage(selection, after, limit + 1);
  const page = rows.slice(0, limit);
  const [totals, facets, datasets] = await Promise.all([
    selectTotals(selection),
    countFacets(selection),
    describe(page, selection),
  ]);
  const last = rows.length > limit ? page.at(-1) : undefined;
  return {
    ok: true,
    list: {
      datasets,
      total: { datasets: totals.datasets, ...countsOf(totals.points) },
      window: countedWindow(filters, selection.window),
      facets,
      next: last ? addressAfter(last, query) : null,
    },
  };
}

function placeOf(cursor: string): DatasetPlace | null {
  const place = decodeCursor(cursor, ['number', 'number']);
  return place && { publishedAt: Number(place[0]), accession: Number(place[1]) };
}

function addressAfter(
  { publishedAt, accession }: DatasetHead,
  { limit, cursor: _, ...filters }: DatasetQuery,
) {
  const parameters = filterParameters(filters);
  if (limit !== USUAL_LIMIT) parameters.set('limit', String(limit));
  return nextAddress('/api/v1/datasets', parameters, encodeCursor([publishedAt, accession]));
}

async function describe(page: DatasetHead[], { window }: Selection): Promise<DatasetItem[]> {
  const accessions = page.map(({ accession }) => accession);
  if (accessions.length === 0) return [];
  const [columns, inWindow] = await Promise.all([
    selectStripColumns(
      page.filter((head) => keptStrip(head, window) === null).map(({ accession }) => accession),
    ),
    window ? selectWindowCounts(accessions, window) : null,
  ]);
  return page.map((head) => {
    const isOwn = ({ accession }: { accession: number }) => accession === head.accession;
    const counts = inWindow ? countsOf(inWindow.filter(isOwn)) : allPoints(head);
    const strip = keptStrip(head, window) ?? drawStrip(columns.filter(isOwn), window);
    return itemOf(head, counts, strip);
  });
}

/** The strip as it was drawn at publication; null where there is none, or where a window cuts it. */
function keptStrip({ strip }: DatasetHead, window: Selection['window']): DatasetItem['strip'] | null {
  return strip === null || window !== null ? null : (JSON.parse(strip) as DatasetItem['strip']);
}

function itemOf(head: DatasetHead, counts: PointCounts, strip: DatasetItem['strip']): DatasetItem {
  const { revision, title, ligands, rmsZ, pValue, fittedHere } = head;
  return {
    accession: formatAccession(head.accession),
    revision,
    title,
    lab: { slug: head.labSlug, name: head.labName },
    system: { slug: head.system, name: head.systemName },
    ligands,
    counts,
    rmsZ,
    pValue,
    fittedHere,
    publishedAt: new Date(head.publishedAt).toISOString(),
    strip,
  };
}

function allPoints({ points, onCurve, warning, offCurve }: DatasetHead): PointCounts {
  return { points, onCurve, warning, offCurve };
}

/** The choices of a filter; what is chosen is one of them, by its name, even where it fits nothing any more. */
async function facetWithChosen(name: 'system' | 'lab', selection: Selection): Promise<Facets['system']> {
  const choices = await selectFacet(name, selection);
  const missing = selection.filters[name].filter((slug) => !choices.some(({ value }) => value === slug));
  if (missing.length === 0) return choices;
  const named = await selectFacetNames(name, missing);
  return [...choices, ...named.map((choice) => ({ ...choice, datasets: 0 }))];
}

async function countFacets(selection: Selection): Promise<Facets> {
  const [system, lab, ligand, flags] = await Promise.all([
    facetWithChosen('system', selection),
    facetWithChosen('lab', selection),
    selectFacet('ligand', selection),
    selectFlagFacet(selection),
  ]);
  const flag = POINT_FLAGS.map((value) => ({ value, name: FLAG_WORDS[value], datasets: flags[value] }));
  return { system, lab, ligand, flag };
}
