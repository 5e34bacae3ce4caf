import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';
import { saveFile } from '@/components/ui/save-file';
import type { DepositAnswer } from '@/schemas/deposit';
import { Moment } from './moment';

interface StaleNoticeProps {
  theirs: DepositAnswer;
  busy: boolean;
  onLoad: () => void;
  onOverwrite: () => void;
}

/** The draft was saved by somebody else meanwhile: both are there, and one is to be chosen. */
export function StaleNotice({ theirs, busy, onLoad, onOverwrite }: StaleNoticeProps) {
  return (
    <Notice kind="warning" title="Changed meanwhile" live>
      <p className="text-sm">
        {theirs.updatedBy ?? 'A curator'} saved this draft after you had opened it,{' '}
        <Moment at={theirs.updatedAt} />. What you have here is not saved, and not lost.
      </p>
      <p className="flex flex-wrap gap-x-5 gap-y-1">
        <Button onClick={onLoad}>Load theirs, keep mine as text</Button>
        <Button disabled={busy} onClick={onOverwrite}>
          Save mine over theirs
        </Button>
      </p>
    </Notice>
  );
}

interface OwnTextProps {
  text: string;
  /** the rest of the page waits for the answer */
  isAsked: boolean;
  onTakeUp: () => void;
  onDiscard: () => void;
}

/** What one had before theirs was loaded, or left unsaved: to be read, kept as a file, or taken up again. */
export function OwnText({ text, isAsked, onTakeUp, onDiscard }: OwnTextProps) {
  return (
    <Notice kind="warning" title="Your unsaved changes are kept in this browser tab" live>
      <p className="max-w-[46rem] text-sm">
        The form shows the draft as it is saved on the server.{' '}
        {isAsked ? 'Take your changes up or discard them first; then you can type on.' : ''}
      </p>
      <Disclosure summary="Read them" className="text-sm">
        <textarea
          readOnly
          aria-label="Your text"
          rows={10}
          wrap="off"
          value={text}
          className="source-text w-full bg-wash p-2"
        />
      </Disclosure>
      <p className="flex flex-wrap gap-x-5 gap-y-1">
        <Button onClick={onTakeUp}>Take them up</Button>
        <Button onClick={() => saveFile('draft.json', text)}>Keep as a file</Button>
        <Button onClick={onDiscard}>Discard them</Button>
      </p>
    </Notice>
  );
}
