/** The command `npm run demo`: builds where that is needed, then serves the demonstration and says where. */
import { spawn } from 'node:child_process';
import path from 'node:path';
import { checkEnvOrExit } from '@/lib/env';
import { buildIfStale } from './build-all';
import { onceOrphaned } from './stop-on-signal';

checkEnvOrExit();
await buildIfStale();
const variables = { LOG_LEVEL: 'warn', ...process.env, CURVEKEEP_DEMO: '1' };
const server = spawn(process.execPath, [path.join('.build', 'serve.js')], {
  stdio: 'inherit',
  env: variables,
});
// The server stops in order at a signal; this process waits for it and ends as it does.
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => server.kill(signal));
onceOrphaned(() => server.kill('SIGTERM'));
server.once('exit', (code) => process.exit(code ?? 1));
