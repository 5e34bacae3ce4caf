/** Builds everything that serving needs, unless it stands there already. */
import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';

/** All that a build is made of. */
const SOURCES = [
  ...[
    'app',
    'components',
    'db',
    'lib',
    'public',
    'schemas',
    'storage',
    'instrumentation.ts',
    'next.config.ts',
  ],
  ...['package-lock.json', 'package.json', 'postcss.config.mjs', 'proxy.ts', 'tsconfig.json'],
];

const STAMP = path.join('.build', 'stamp');
/** Stands where the pages are built whole. */
const PAGES = path.join('.next', 'BUILD_ID');

/** Builds where the sources are not those of the last build. */
export async function buildIfStale(): Promise<void> {
  const built = await Promise.all([STAMP, PAGES].map((file) => readFile(file, 'utf8').catch(() => '')));
  if (built[1] !== '' && built[0] === (await sourcesHash())) return;
  await buildAll();
}

/** Builds programs and pages and notes from which sources. */
export async function buildAll(): Promise<void> {
  const hash = await sourcesHash();
  await rm(STAMP, { force: true });
  // Loaded only here: a start that finds everything built needs no bundler.
  const { buildPrograms } = await import('./build-programs');
  await buildPrograms();
  await buildPages();
  await mkdir(path.dirname(STAMP), { recursive: true });
  await writeFile(STAMP, hash);
}

/** Hash over names and content of all sources. */
async function sourcesHash(): Promise<string> {
  const hash = createHash('sha256');
  for (const file of (await Promise.all(SOURCES.map(filesUnder))).flat().sort()) {
    hash
      .update(file)
      .update('\0')
      .update(await readFile(file))
      .update('\0');
  }
  return hash.digest('hex');
}

async function filesUnder(place: string): Promise<string[]> {
  try {
    const entries = await readdir(place, { recursive: true, withFileTypes: true });
    return entries.filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath, entry.name));
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'ENOENT') return [];
    if (code === 'ENOTDIR') return [place];
    throw error;
  }
}

async function buildPages(): Promise<void> {
  const variables = { ...process.env, NODE_ENV: 'production' as const, NEXT_TELEMETRY_DISABLED: '1' };
  const next = path.join('node_modules', 'next', 'dist', 'bin', 'next');
  const child = spawn(process.execPath, [next, 'build'], { stdio: 'inherit', env: variables });
  const code = await new Promise((resolve, reject) => child.once('exit', resolve).once('error', reject));
  if (code === 0) return;
  // What a failed build leaves behind can make the next one fail as well.
  await rm('.next', { recursive: true, force: true });
  throw new Error('The pages could not be built; what is wrong stands above.');
}
