/** The rules on who may import whom are only worth something if they are seen to fail. */
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { cruise, type ICruiseResult } from 'dependency-cruiser';
import extractTSConfig from 'dependency-cruiser/config-utl/extract-ts-config';
import { describe, expect, it } from 'vitest';

const configuration = createRequire(import.meta.url)('../.dependency-cruiser.cjs');

async function cruiseFolder(baseDir: string, folders: string[]): Promise<ICruiseResult> {
  const options = {
    ...configuration.options,
    tsConfig: undefined,
    ruleSet: configuration,
    validate: true,
    baseDir,
  };
  const { output } = await cruise(folders, options);
  if (typeof output === 'string') throw new Error('dependency-cruiser answered with text');
  return output;
}

/** Names of the rules that a small tree of files breaks. */
async function brokenRules(files: Record<string, string>): Promise<string[]> {
  const baseDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-rules-'));
  try {
    for (const [file, content] of Object.entries(files)) {
      await mkdir(path.join(baseDir, path.dirname(file)), { recursive: true });
      await writeFile(path.join(baseDir, file), content);
    }
    const folders = new Set(Object.keys(files).map((file) => file.split('/')[0] ?? ''));
    folders.delete('node_modules');
    const { summary } = await cruiseFolder(baseDir, [...folders]);
    return summary.violations.map((violation) => violation.rule.name);
  } finally {
    await rm(baseDir, { recursive: true });
  }
}

const value = 'export const x = 1;';

describe('dependency rules', () => {
  it.each([
    [
      'app',
      {
        'app/page.tsx': "import { x } from '../db/client'; export default () => <b>{x}</b>;",
        'db/client.ts': value,
      },
    ],
    [
      'components',
      {
        'components/a.tsx': "import { x } from '../lib/env'; export const A = () => <b>{x}</b>;",
        'lib/env.ts': value,
      },
    ],
    ['lib', { 'lib/labs/a.ts': "import { x } from '../../components/b';", 'components/b.ts': value }],
    ['engine', { 'lib/engine/a.ts': "import { x } from '../env';", 'lib/env.ts': value }],
    ['engine-packages', { 'lib/engine/a.ts': "import { readFileSync } from 'node:fs'; readFileSync('');" }],
    ['db', { 'db/a.ts': "import { x } from '../lib/labs/b';", 'lib/labs/b.ts': value }],
    ['schemas', { 'schemas/a.ts': "import { x } from '../lib/env';", 'lib/env.ts': value }],
    ['no-tests-in-the-product', { 'lib/a.ts': "import { x } from '../tests/b';", 'tests/b.ts': value }],
    ['no-circle', { 'lib/a.ts': "import './b';", 'lib/b.ts': "import './a';" }],
    ['resolves', { 'lib/a.ts': "import './nowhere';" }],
  ])('%s: a forbidden import is found', async (rule, files) => {
    expect(await brokenRules(files as Record<string, string>)).toContain(rule);
  });

  it('let a component know types from elsewhere', async () => {
    const files = {
      'components/a.tsx': "import type { X } from '../lib/labs/b'; export const A = (x: X) => <b>{x}</b>;",
      'lib/labs/b.ts': 'export type X = string;',
    };
    expect(await brokenRules(files)).toEqual([]);
  });

  it('SQL is for db/ alone', async () => {
    const drizzle = { 'node_modules/drizzle-orm/package.json': '{"name":"drizzle-orm","main":"index.js"}' };
    const files = { ...drizzle, 'node_modules/drizzle-orm/index.js': 'module.exports = 1;' };
    const importing = "import drizzle from 'drizzle-orm'; drizzle();";
    expect(await brokenRules({ ...files, 'lib/labs/load-lab.ts': importing })).toContain(
      'drizzle-in-db-only',
    );
    expect(await brokenRules({ ...files, 'db/queries/labs.ts': importing })).toEqual([]);
  });

  it('hold for this project, and all of it was read', async () => {
    const baseDir = path.resolve('.');
    const options = { ...configuration.options, ruleSet: configuration, validate: true, baseDir };
    const { output } = await cruise(
      ['app', 'components', 'db', 'lib', 'schemas', 'storage'],
      options,
      undefined,
      {
        tsConfig: extractTSConfig('tsconfig.json'),
      },
    );
    if (typeof output === 'string') throw new Error('dependency-cruiser answered with text');
    expect(output.summary.violations).toEqual([]);
    expect(
      output.modules.filter((module) => module.source.endsWith('.tsx') && module.dependencies.length > 0)
        .length,
    ).toBeGreaterThan(5);
    expect(output.summary.totalCruised).toBeGreaterThan(100);
    expect(output.summary.totalDependenciesCruised ?? 0).toBeGreaterThan(200);
  });
});
