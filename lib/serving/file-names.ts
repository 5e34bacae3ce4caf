/** File names in `Content-Disposition`, both ways (RFC 6266, RFC 8187). A name is something to show, never a path. */

/** Longest name that is kept, in characters. */
const MOST_CHARACTERS = 200;

/** Control characters, and those that turn the direction of writing and so could disguise an ending. */
const UNSEEN = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}]/gu;

/** A name as it is kept: the part behind the last slash of either kind, without unseen characters; null where nothing is left. */
export function cleanFileName(name: string): string | null {
  const last = name.normalize('NFC').replace(UNSEEN, '').split(/[/\\]/).at(-1)?.trim() ?? '';
  const kept = [...last].slice(0, MOST_CHARACTERS).join('').trim();
  return kept === '' || /^\.+$/.test(kept) ? null : kept;
}

/** The file name that a Content-Disposition header states; null where it states none that can be read. */
export function statedFileName(header: string | null): string | null {
  if (header === null) return null;
  const extended = /;\s*filename\*\s*=\s*utf-8'[^']*'([^;\s]+)/i.exec(header)?.[1];
  if (extended !== undefined) return decoded(extended);
  const quoted = /;\s*filename\s*=\s*"((?:[^"\\]|\\.)*)"/i.exec(header)?.[1];
  if (quoted !== undefined) return quoted.replace(/\\(.)/g, '$1');
  return /;\s*filename\s*=\s*([^;\s"]+)/i.exec(header)?.[1] ?? null;
}

/** `Content-Disposition` of a download: the name in UTF-8, and a plain one for programs that know no other. */
export function attachmentHeader(name: string): string {
  const plain = name.replace(/[^A-Za-z0-9 ._()-]/g, '_');
  const extended = encodeURIComponent(name).replace(
    /['()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${extended}`;
}

function decoded(text: string): string | null {
  try {
    return decodeURIComponent(text);
  } catch {
    return null;
  }
}
