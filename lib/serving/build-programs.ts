/** Bundles the programs that run outside Next into plain JavaScript, so that serving needs no TypeScript loader. */
import { type BuildOptions, build, context } from 'esbuild';

const OPTIONS: BuildOptions = {
  entryPoints: {
    serve: 'lib/serving/serve.ts',
    migrate: 'db/migrate.ts',
    'assessment-worker': 'lib/assessments/assessment-worker.ts',
    'refit-worker': 'lib/refits/refit-worker.ts',
  },
  outdir: '.build',
  bundle: true,
  packages: 'external',
  platform: 'node',
  format: 'esm',
  target: 'node20',
  sourcemap: 'linked',
  logLevel: 'warning',
};

/** Bundles them once. */
export async function buildPrograms(): Promise<void> {
  await build(OPTIONS);
}

/** Bundles them now and again whenever a source changes. */
export async function watchPrograms(): Promise<void> {
  await buildPrograms();
  const watching = await context(OPTIONS);
  await watching.watch();
}
