import { saveFile } from '@/components/check/save-file';
import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';
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
    <Notice kind="warning" title="Changed by somebody else meanwhile" live>
      <p className="text-sm">
        Somebody else of {theirs.laboratory.name}, a script of it, or you in another window saved version{' '}
        {theirs.version}, <Moment at={theirs.updatedAt} />. What you have here is not saved, and not lost.
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
  onTakeUp: () => void;
  onDiscard: () => void;
}

/** What one had before theirs was loaded, or left unsaved: to be read, kept as a file, or taken up again. */
export function OwnText({ text, onTakeUp, onDiscard }: OwnTextProps) {
  return (
    <Notice kind="note" title="Your unsaved changes are kept here">
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
