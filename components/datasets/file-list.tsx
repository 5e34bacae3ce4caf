import { formatBytes } from '@/components/ui/format-bytes';
import type { DatasetAnswer } from '@/schemas/dataset-answers';

/** The original files, each with its size and digest. */
export function FileList({ files }: { files: DatasetAnswer['files'] }) {
  if (files.length === 0)
    return <p className="text-soft">None were attached. The document holds all that is judged here.</p>;
  return (
    <ul className="space-y-2">
      {files.map(({ id, name, size, sha256, mediaType, href }) => (
        <li key={id}>
          <a
            href={href}
            download={name}
            className="inline-block min-h-6 break-all font-semibold text-act underline-offset-4 hover:underline"
          >
            {name}
          </a>
          <span className="figures block text-sm text-soft">
            {formatBytes(size)}, {mediaType}
          </span>
          <span className="block break-all text-soft text-xs">SHA-256 {sha256}</span>
        </li>
      ))}
    </ul>
  );
}
