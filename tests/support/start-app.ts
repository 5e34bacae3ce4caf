/** Starts the built application on a free port with a data folder of its own, as `npm start` does. */
import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createInterface } from 'node:readline';

export interface RunningApp {
  /** `http://127.0.0.1:<port>` */
  url: string;
  dataDir: string;
  process: ChildProcess;
  /** what it has logged so far, one JSON object a line */
  logged: () => Record<string, unknown>[];
  /** sends SIGTERM and waits; resolves to the exit code */
  stop: () => Promise<number | null>;
}

const START_MS = 30_000;

/** Starts it; `variables` are added to the environment (`CURVEKEEP_DEMO`, `TRUSTED_PROXIES` …). */
export async function startApp(variables: Record<string, string> = {}): Promise<RunningApp> {
  const dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-test-'));
  const environment = {
    ...process.env,
    PORT: '0',
    CURVEKEEP_DATA_DIR: dataDir,
    LOG_LEVEL: 'info',
    ...variables,
  };
  // Vitest's own NODE_ENV is no matter of the application's.
  const child = spawn(process.execPath, ['.build/serve.js'], {
    env: { ...environment, NODE_ENV: 'production' },
  });
  const lines: Record<string, unknown>[] = [];
  let errors = '';
  child.stderr.on('data', (chunk) => {
    errors += chunk;
  });
  const exited = once(child, 'exit').then(([code]) => code as number | null);
  const url = await new Promise<string>((resolve, reject) => {
    const late = setTimeout(
      () => reject(new Error(`The application did not start in time. ${errors}`)),
      START_MS,
    );
    createInterface({ input: child.stdout }).on('line', (line) => {
      if (!line.startsWith('{')) return;
      const entry = JSON.parse(line) as Record<string, unknown>;
      lines.push(entry);
      if (entry.msg !== 'listening') return;
      clearTimeout(late);
      resolve(String(entry.url));
    });
    exited.then((code) => reject(new Error(`The application ended with ${code}. ${errors}`)), reject);
  });
  const stop = async () => {
    const endedBefore = child.exitCode !== null || child.signalCode !== null;
    if (!endedBefore) child.kill('SIGTERM');
    const code = await exited;
    await rm(dataDir, { recursive: true, force: true });
    if (endedBefore)
      throw new Error(`The application had ended by itself with ${code ?? child.signalCode}. ${errors}`);
    return code;
  };
  return { url, dataDir, process: child, logged: () => lines, stop };
}
