/** How a published revision is cited: a sentence, BibTeX, RIS and CSL-JSON. Pure. */
import type { Citation } from '@/schemas/dataset-answers';

export interface Cited {
  /** with the revision, `CK-000123.2` */
  accession: string;
  title: string;
  authors: string[];
  /** day of publication of the revision, `2026-11-19` */
  day: string;
  /** landing page of the revision */
  url: string;
}

const PUBLISHER = 'Curvekeep';

/** Names stand as the document gives them: which part is the family's cannot be told. */
export function cite(cited: Cited): Citation {
  const plain = {
    ...cited,
    title: oneLine(cited.title),
    authors: cited.authors.map(oneLine),
  };
  return { text: sentence(plain), bibtex: bibtex(plain), ris: ris(plain), csl: cslJson(plain) };
}

function sentence({ authors, day, title, accession, url }: Cited): string {
  return `${authors.join(', ')} (${day.slice(0, 4)}). ${title} [Data set]. ${PUBLISHER}, ${accession}. ${url}`;
}

function bibtex({ authors, day, title, accession, url }: Cited): string {
  const fields = {
    author: authors.map((author) => `{${escapeTex(author)}}`).join(' and '),
    title: `{${escapeTex(title)}}`,
    year: day.slice(0, 4),
    publisher: PUBLISHER,
    note: `Data set ${accession}`,
    url,
  };
  const lines = Object.entries(fields).map(([name, value]) => `  ${name} = {${value}}`);
  return `@misc{${accession},\n${lines.join(',\n')}\n}\n`;
}

function ris({ authors, day, title, accession, url }: Cited): string {
  const lines = [
    ['TY', 'DATA'],
    ...authors.map((author) => ['AU', author]),
    ['TI', title],
    ['PY', day.slice(0, 4)],
    ['DA', day.replaceAll('-', '/')],
    ['PB', PUBLISHER],
    ['AN', accession],
    ['UR', url],
    ['ER', ''],
  ];
  return lines.map(([tag, value]) => `${tag}  - ${value}\r\n`).join('');
}

function cslJson({ authors, day, title, accession, url }: Cited): Record<string, unknown> {
  return {
    id: accession,
    type: 'dataset',
    title,
    author: authors.map((literal) => ({ literal })),
    issued: { 'date-parts': [day.split('-').map(Number)] },
    publisher: PUBLISHER,
    number: accession,
    URL: url,
  };
}

/** Reference formats are line by line: a name must not begin a line of its own. */
function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ').trim();
}

const TEX: Record<string, string> = {
  '\\': '\\textbackslash{}',
  '~': '\\textasciitilde{}',
  '^': '\\textasciicircum{}',
};

function escapeTex(text: string): string {
  return text.replace(/[\\~^{}&%$#_]/g, (character) => TEX[character] ?? `\\${character}`);
}
