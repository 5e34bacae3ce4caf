'use client';

import { useEffect, useRef, useState } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { ScrollingCell } from '@/components/layout/scrolling-cell';
import { TrialBand } from '@/components/reasons/trial-band';
import { Button } from '@/components/ui/button';
import type { SelectOption } from '@/components/ui/select-field';
import { selectLine } from '@/components/ui/select-line';
import type { SyntaxProblem } from '@/lib/documents/find-syntax-error';
import { locatePointer } from '@/lib/documents/locate-pointer';
import type { DepositAnswer } from '@/schemas/deposit';
import type { FileAnswer } from '@/schemas/file';
import { DeleteDraft } from './delete-draft';
import { DepositFiles } from './deposit-files';
import { DocumentText } from './document-text';
import { accessTo, isUnchanged } from './draft-access';
import { DraftBar } from './draft-bar';
import { DraftCollapse } from './draft-collapse';
import { DraftReasons, useDraftReasons } from './draft-reasons';
import { DraftStatus, DraftVerdict } from './draft-status';
import { DraftTables } from './draft-tables';
import { listOf, objectOf, readDraft, textOf } from './draft-value';
import { EditorSections } from './editor-sections';
import { ErrorList } from './error-list';
import { inFormWords } from './form-words';
import { controlOf, type EditorSection, placeOf } from './go-to-place';
import { Letters } from './letters';
import { POINTS_A_PAGE, PointsEditor } from './points-editor';
import { ProblemNotice } from './problem-notice';
import { OwnText, StaleNotice } from './stale-notice';
import { SubmitForm } from './submit-form';
import { type SavedDraft, useDraft } from './use-draft';
import { useDraftAssessment } from './use-draft-assessment';
import { useDraftCalls } from './use-draft-calls';
import { useKeptDraft } from './use-kept-draft';
import { useLeaveWarning } from './use-leave-warning';
import { useOffCurveSteps } from './use-off-curve-steps';
import { useSaveKey } from './use-save-key';

export type DepositRecord = Omit<DepositAnswer, 'document'>;

interface DepositEditorProps {
  deposit: DepositRecord;
  /** the document as it was sent */
  text: string;
  files: FileAnswer[];
  systems: readonly SelectOption[];
}

/** A draft in three columns: the document as a form, its collapse and points, its state and what there is to do. */
export function DepositEditor({ deposit, text, files, systems }: DepositEditorProps) {
  const { id } = deposit;
  const draft = useDraft(savedOf(deposit, text));
  const { saved, content, edit, isDirty } = draft;
  const calls = useDraftCalls(id, draft);
  const kept = useKeptDraft(id, draft);
  const { assessed, error, isFetching } = useDraftAssessment(id, saved);
  const [own, setOwn] = useState<string | null>(null);
  const [problem, setProblem] = useState<SyntaxProblem | null>(null);
  const [section, setSection] = useState<EditorSection>(saved.errors.length > 0 ? 'identity' : 'series');
  const [series, setSeries] = useState(0);
  const [page, setPage] = useState(0);
  const [goal, setGoal] = useState<{ pointer: string } | null>(null);
  const area = useRef<HTMLTextAreaElement>(null);
  const form = useRef<HTMLDivElement>(null);

  const save = () => {
    setProblem(null);
    if (isDirty && !calls.save.isPending) calls.save.mutate(null);
  };
  useSaveKey(save);
  useLeaveWarning(isDirty);
  const choose = (next: number) => {
    setSeries(next);
    setPage(0);
  };
  const go = (pointer: string) => {
    if (edit === null) {
      const place = placeOf(pointer);
      setSection(place.section);
      if (place.series !== null) setSeries(place.series);
      if (place.point !== null) setPage(Math.floor(place.point / POINTS_A_PAGE));
    }
    setGoal({ pointer });
  };
  const { openText } = draft;
  const isText = edit !== null;
  useEffect(() => {
    if (goal === null || form.current === null) return;
    if (isText) {
      if (area.current === null) return;
      const { line, column } = locatePointer(area.current.value, goal.pointer);
      selectLine(area.current, line, column);
      return setGoal(null);
    }
    const control = controlOf(form.current, goal.pointer);
    // What the form has no field for is reached in the text, at the next turn.
    if (control === null) return openText();
    control.focus();
    setGoal(null);
  }, [goal, openText, isText]);

  const worded = saved.errors.map((one) => inFormWords(one, content.value));
  const access = accessTo(content.value, saved.content.value, worded, draft.set);
  const showOffCurve = useOffCurveSteps(assessed?.data ?? null, go);
  const isStale = assessed !== null && assessed.value !== content.value;
  const reasons = useDraftReasons(assessed?.data ?? null, draft, isStale);
  const shownSeries = Math.min(series, Math.max(0, listOf(content.value.series).length - 1));
  const complaint = calls.complaint;
  const takeUp = (kept: string) => {
    const value = readDraft(kept);
    if (value !== null) draft.replace({ value, text: kept });
  };
  const left = own ?? kept.left?.text ?? null;
  const forget = () => {
    setOwn(null);
    kept.forget();
  };
  // What an earlier visit left is taken up or discarded first: a second unsaved version would take its place.
  const isAsked = kept.left !== null && own === null;
  return (
    <div ref={form} className="flex grow flex-col">
      <DraftBar
        state={deposit.state}
        errors={saved.errors.length}
        isDirty={isDirty}
        isSaving={calls.save.isPending}
        onSave={save}
      />
      {left === null ? null : (
        <div className="page-width py-4">
          <OwnText
            text={left}
            isAsked={isAsked}
            onTakeUp={() => {
              takeUp(left);
              forget();
            }}
            onDiscard={forget}
          />
        </div>
      )}
      <div inert={isAsked} className="flex grow flex-col inert:opacity-50">
        <AxisFrame
          who={
            <ScrollingCell label="The draft" stuck>
              <h1 className="head break-words text-xl">{textOf(content.value.title) || 'Untitled draft'}</h1>
              <p className="mt-1 text-sm text-soft">{deposit.laboratory.name}</p>
              <p className="mt-2">
                {edit === null ? (
                  <Button onClick={openText}>Document as JSON</Button>
                ) : (
                  <Button onClick={() => setProblem(placed(draft.closeText()))}>Back to the form</Button>
                )}
              </p>
              {edit === null ? (
                <EditorSections
                  draft={access}
                  systems={systems}
                  section={section}
                  onSection={setSection}
                  series={shownSeries}
                  onSeries={choose}
                />
              ) : (
                <p className="mt-4 text-sm text-soft">
                  The whole document, for what the form has no field for. Save it from here, or go back to the
                  form.
                </p>
              )}
            </ScrollingCell>
          }
          axis={
            edit === null ? (
              <div className="flex h-full flex-col">
                {assessed ? (
                  <>
                    <TrialBand stated={assessed.data} trials={reasons.trials} />
                    <DraftCollapse
                      data={reasons.trials.drawn?.data ?? assessed.data}
                      opening={reasons.trials.drawn?.window}
                      series={shownSeries}
                      onSeries={choose}
                    />
                  </>
                ) : (
                  <p className="border-hairline border-b px-2 py-3 text-soft max-lg:px-0">
                    {saved.errors.length > 0
                      ? 'The collapse is drawn here once nothing is left to mend.'
                      : isFetching
                        ? 'Computing the collapse …'
                        : 'The collapse could not be computed.'}
                  </p>
                )}
                <PointsEditor
                  key={shownSeries}
                  draft={access}
                  series={shownSeries}
                  page={page}
                  onPage={setPage}
                  isStale={isStale}
                  computedAt={(index) => {
                    const assessedPoint = assessed?.data.series[shownSeries]?.assessed.points[index];
                    const isSame =
                      pointAt(assessed?.value, shownSeries, index) ===
                      pointAt(content.value, shownSeries, index);
                    return isSame ? (assessedPoint ?? null) : null;
                  }}
                />
              </div>
            ) : (
              <DocumentText
                text={edit.text}
                area={area}
                problem={problem ?? placeIn(complaint)}
                onText={(next) => {
                  setProblem(null);
                  draft.setText(next);
                }}
                onLine={(line, column) => area.current && selectLine(area.current, line, column)}
              />
            )
          }
          verdict={
            <ScrollingCell label="State of the draft" stuck>
              <DraftStatus
                state={deposit.state}
                updatedAt={saved.updatedAt}
                isDirty={isDirty}
                isSaving={calls.save.isPending}
                onSave={save}
              />
              <div className="mt-4 space-y-4 empty:hidden">
                {calls.theirs ? (
                  <StaleNotice
                    theirs={calls.theirs}
                    busy={calls.save.isPending}
                    onLoad={() => setOwn(calls.loadTheirs())}
                    onOverwrite={() => calls.save.mutate(calls.theirs)}
                  />
                ) : null}
                {complaint && (edit === null || complaint.line === undefined) ? (
                  <ProblemNotice error={calls.save.error} isKept />
                ) : null}
              </div>
              <Letters decisions={deposit.decisions} />
              {saved.errors.length > 0 ? (
                <ErrorList
                  errors={saved.errors}
                  document={edit === null ? content.value : null}
                  isStanding={(pointer) => isUnchanged(content.value, saved.content.value, pointer)}
                  onGo={go}
                />
              ) : null}
              {assessed ? (
                <>
                  <DraftVerdict
                    summary={(reasons.trials.trial ?? assessed).data.assessment.summary}
                    isStale={isStale}
                    isTrial={reasons.trials.trial !== null}
                    onOffCurve={showOffCurve}
                  />
                  <DraftReasons data={assessed.data} reasons={reasons} />
                </>
              ) : null}
              <ProblemNotice error={error} isKept />
              <DepositFiles id={id} initial={files} editable />
              <SubmitForm
                obstacle={obstacleOf(isDirty, saved.errors.length)}
                busy={calls.submit.isPending || calls.submit.isSuccess}
                onSubmit={() => calls.submit.mutate()}
              />
              <ProblemNotice error={calls.submit.error} isKept />
              {deposit.state === 'draft' ? (
                <DeleteDraft busy={calls.remove.isPending} onDelete={() => calls.remove.mutate()} />
              ) : null}
              <ProblemNotice error={calls.remove.error} isKept />
            </ScrollingCell>
          }
        />
        {assessed && edit === null ? (
          <DraftTables data={assessed.data} reasons={reasons} isStale={isStale} />
        ) : null}
      </div>
    </div>
  );
}

function savedOf({ version, updatedAt, errors }: DepositRecord, text: string): SavedDraft {
  return {
    version,
    updatedAt: Date.parse(updatedAt),
    errors,
    content: { value: readDraft(text) ?? {}, text },
  };
}

function pointAt(value: unknown, series: number, index: number): unknown {
  return listOf(objectOf(listOf(objectOf(value).series)[series]).points)[index];
}

/** What is wrong with a text, beginning with where, as the server says it. */
function placed(problem: SyntaxProblem | null): SyntaxProblem | null {
  if (problem === null) return null;
  const { line, column, detail } = problem;
  return { line, column, detail: `Line ${line}, column ${column}: ${detail}.` };
}

/** Where the server stopped reading a text that is not JSON. */
function placeIn(complaint: { line?: number; column?: number; detail: string } | null): SyntaxProblem | null {
  if (complaint?.line === undefined) return null;
  return {
    line: complaint.line,
    column: complaint.column ?? 1,
    detail: `${complaint.detail} Nothing was saved.`,
  };
}

/** Why the draft cannot be submitted now. */
function obstacleOf(isDirty: boolean, errors: number): string | null {
  if (isDirty) return 'Save it first.';
  return errors > 0 ? 'Mend what is wrong first.' : null;
}
