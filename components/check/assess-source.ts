/** From what was pasted to its assessment, or to all that is to be mended, each thing at its line. */

import { type PlotData, plotDataOf } from '@/components/plots/plot-data';
import { assembleDocument } from '@/lib/documents/assemble-document';
import { locateCsvRow } from '@/lib/documents/locate-csv-row';
import { locatePointers } from '@/lib/documents/locate-pointer';
import { type CsvPoints, readCsvPoints } from '@/lib/documents/read-csv-points';
import { type CsvParametersInput, csvParametersSchema } from '@/schemas/csv-parameters';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { Problem } from '@/schemas/problem';
import { type CsvDraft, formOf, NOT_STATED } from './csv-draft';
import { kindOf, type Source, type SourceProblem } from './read-source';
import { requestAssessment } from './request-assessment';

export type SourceOutcome =
  | { kind: 'assessed'; data: PlotData }
  | { kind: 'to-mend'; problems: SourceProblem[]; formErrors: ReadonlyMap<string, string> }
  /** nothing is wrong with the source: the server refused or did not answer */
  | { kind: 'refused'; title: string; detail: string };

/** Something to send, with the way from a pointer back to the source. */
interface Prepared {
  body: string;
  document: DatasetDocument;
  locate: (pointers: string[]) => Map<string, { line: number; column: number | null }>;
}

type Preparation = Prepared | Extract<SourceOutcome, { kind: 'to-mend' }>;

/**
 * Assesses what was pasted.
 *
 * @param draft the form beside a table; null for a document
 * @throws DOMException where `signal` aborts
 */
export async function assessSource(
  source: Source,
  draft: CsvDraft | null,
  signal: AbortSignal,
): Promise<SourceOutcome> {
  if (kindOf(source) === 'document') return assessText(source.text, signal);
  const prepared = prepareTable(source, draft);
  return 'kind' in prepared ? prepared : send(prepared, signal);
}

export type SourceDocument = { kind: 'document'; text: string } | Extract<SourceOutcome, { kind: 'to-mend' }>;

/** The document that a source is, as it stands, or that a table and its form make. */
export function documentOf(source: Source, draft: CsvDraft | null): SourceDocument {
  if (kindOf(source) === 'document') return { kind: 'document', text: source.text };
  const prepared = prepareTable(source, draft);
  return 'kind' in prepared
    ? prepared
    : { kind: 'document', text: JSON.stringify(prepared.document, null, 2) };
}

/** The server judges the text as it stands, so that its place of a slip is that of the text. */
async function assessText(text: string, signal: AbortSignal): Promise<SourceOutcome> {
  const answer = await ask(text, signal);
  if ('kind' in answer) return answer;
  if (answer.ok) {
    // The server passes over a byte order mark; JSON.parse does not.
    const document: DatasetDocument = JSON.parse(text.replace(/^\uFEFF/, ''));
    return { kind: 'assessed', data: plotDataOf(document, answer.assessment) };
  }
  return outcomeOf(answer.problem, (pointers) => locatePointers(text, pointers));
}

async function send({ body, document, locate }: Prepared, signal: AbortSignal): Promise<SourceOutcome> {
  const answer = await ask(body, signal);
  if ('kind' in answer) return answer;
  if (answer.ok) return { kind: 'assessed', data: plotDataOf(document, answer.assessment) };
  return outcomeOf(answer.problem, locate);
}

async function ask(body: string, signal: AbortSignal) {
  try {
    return await requestAssessment(body, signal);
  } catch (error) {
    if (signal.aborted) throw error;
    return {
      kind: 'refused' as const,
      title: 'The server did not answer',
      detail: 'What you pasted is kept here. Check the connection and assess again.',
    };
  }
}

function outcomeOf(problem: Problem, locate: Prepared['locate']): SourceOutcome {
  if (problem.errors) {
    const places = locate(problem.errors.map(({ pointer }) => pointer));
    const problems = problem.errors.map(({ pointer, detail }) => {
      const place = places.get(pointer);
      return { line: place?.line ?? null, column: place?.column ?? null, pointer, detail };
    });
    return { kind: 'to-mend', problems, formErrors: new Map() };
  }
  if (problem.line !== undefined) {
    const { line, column = null, detail = problem.title } = problem;
    return { kind: 'to-mend', problems: [{ line, column, pointer: null, detail }], formErrors: new Map() };
  }
  return { kind: 'refused', title: problem.title, detail: `${problem.detail} What you pasted is kept here.` };
}

function prepareTable(source: Source, draft: CsvDraft | null): Preparation {
  const table = readCsvPoints(source.text);
  if (table.problems.length > 0 || draft === null) {
    const problems = table.problems.map(({ line, detail }) => ({
      line,
      column: null,
      pointer: null,
      detail,
    }));
    return { kind: 'to-mend', problems, formErrors: new Map() };
  }
  const form = csvParametersSchema.safeParse(formOf(draft, table, source.name ?? 'Table of points'));
  if (!form.success) return formProblems(form.error.issues);
  const document = assembleTable(table, form.data);
  return { body: JSON.stringify(document), document, locate: (pointers) => locateRows(table, pointers) };
}

function assembleTable(table: CsvPoints, form: CsvParametersInput): DatasetDocument {
  const document = assembleDocument(table, csvParametersSchema.parse(form));
  return { ...document, contributors: [{ name: NOT_STATED, roles: ['Data curation'] }] };
}

function formProblems(issues: readonly { path: PropertyKey[]; message: string }[]): Preparation {
  const formErrors = new Map(issues.map(({ path, message }) => [path.map(String).join('.'), message]));
  const detail =
    formErrors.size === 1
      ? 'One field of the form needs another entry.'
      : `${formErrors.size} fields of the form need other entries.`;
  return { kind: 'to-mend', problems: [{ line: null, column: null, pointer: null, detail }], formErrors };
}

function locateRows(table: CsvPoints, pointers: string[]): Map<string, { line: number; column: null }> {
  const places = new Map<string, { line: number; column: null }>();
  for (const pointer of pointers) {
    const line = locateCsvRow(table, pointer);
    if (line !== null) places.set(pointer, { line, column: null });
  }
  return places;
}
