'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { formatBytes } from '@/components/ui/format-bytes';
import type { FileAnswer } from '@/schemas/file';
import { newKey } from './call-api';
import { listFiles, removeFile, uploadFile } from './deposit-calls';
import { ProblemNotice } from './problem-notice';
import { useCall } from './use-call';
import { isFinal } from './use-call-key';

/** Most bytes of one file. */
const MOST_FILE_BYTES = 100 * 1024 * 1024;

interface DepositFilesProps {
  id: string;
  initial: FileAnswer[];
  /** whether files can be added and taken away */
  editable: boolean;
}

/** The original files of a deposit: what is there, and where one may, adding and taking away. */
export function DepositFiles({ id, initial, editable }: DepositFilesProps) {
  const queries = useQueryClient();
  const key = ['files', id];
  const { data: files } = useQuery({ queryKey: key, queryFn: () => listFiles(id), initialData: initial });
  const changed = () => queries.invalidateQueries({ queryKey: key });
  const removal = useCall({ mutationFn: (file: string) => removeFile(id, file), onSettled: changed });
  if (!editable && files.length === 0) return null;
  return (
    <section aria-label="Files" className="mt-5 border-ink border-t pt-3">
      <h2 className="font-semibold">Files</h2>
      {files.length === 0 ? (
        <p className="mt-1 text-sm text-soft">
          No original files yet. Raw tables, exports and notes stay with the dataset, byte for byte.
        </p>
      ) : (
        <ul className="text-sm">
          {files.map((file) => (
            <FileRow
              key={file.id}
              file={file}
              busy={removal.isPending && removal.variables === file.id}
              onRemove={editable ? () => removal.mutate(file.id) : null}
            />
          ))}
        </ul>
      )}
      <ProblemNotice error={removal.error} />
      {editable ? <Upload id={id} onUploaded={changed} /> : null}
    </section>
  );
}

interface FileRowProps {
  file: FileAnswer;
  busy: boolean;
  /** null: it stays */
  onRemove: (() => void) | null;
}

function FileRow({ file: { name, size, sha256, links }, busy, onRemove }: FileRowProps) {
  return (
    <li className="border-hairline border-b py-2">
      <a
        href={links.self}
        download
        className="break-words font-semibold text-act underline-offset-4 hover:underline"
      >
        {name}
      </a>
      <p className="figures text-soft text-xs">
        {formatBytes(size)}, SHA-256 <span title={sha256}>{sha256.slice(0, 12)}…</span>
      </p>
      {onRemove ? (
        <Button className="text-xs" disabled={busy} onClick={onRemove}>
          {busy ? 'Removing …' : 'Remove'}
          <span className="sr-only"> {name}</span>
        </Button>
      ) : null}
    </li>
  );
}

function Upload({ id, onUploaded }: { id: string; onUploaded: () => Promise<void> }) {
  const [share, setShare] = useState(0);
  const [tooLarge, setTooLarge] = useState<string | null>(null);
  /** what is being sent, until the server has it or has refused it for good; chosen again it is the same */
  const sent = useRef<{ file: string; key: string }>(null);
  const keyOf = ({ name, size, lastModified }: File): string => {
    const file = `${name} ${size} ${lastModified}`;
    if (sent.current?.file !== file) sent.current = { file, key: newKey() };
    return sent.current.key;
  };
  const { mutate, isPending, error, variables } = useCall({
    mutationFn: (file: File) => uploadFile(id, file, keyOf(file), setShare),
    onSuccess: onUploaded,
    onSettled: (_, failure) => {
      if (failure === null || isFinal(failure)) sent.current = null;
    },
  });
  const take = (file: File | undefined) => {
    if (file === undefined) return;
    const fits = file.size <= MOST_FILE_BYTES;
    setTooLarge(fits ? null : `${file.name} is larger than 100 MiB, the most that is taken.`);
    setShare(0);
    if (fits) mutate(file);
  };
  return (
    <div className="mt-2 space-y-2">
      {isPending && variables ? (
        <div>
          <p className="break-words text-sm">
            Sending {variables.name}: <span className="figures">{Math.floor(share * 100)} %</span>
          </p>
          <progress
            value={share}
            aria-label={`Sending ${variables.name}`}
            className="h-1 w-full appearance-none bg-hairline [&::-webkit-progress-bar]:bg-hairline [&::-webkit-progress-value]:bg-act [&::-moz-progress-bar]:bg-act"
          />
        </div>
      ) : (
        <label className="inline-flex min-h-6 cursor-pointer items-center font-semibold text-act underline-offset-4 hover:underline has-focus-visible:outline-2 has-focus-visible:outline-act">
          Add a file
          <input
            type="file"
            className="sr-only"
            onChange={({ target }) => {
              take(target.files?.[0]);
              target.value = '';
            }}
          />
        </label>
      )}
      {tooLarge ? <p className="text-off text-sm">{tooLarge}</p> : null}
      <ProblemNotice error={error} />
    </div>
  );
}
