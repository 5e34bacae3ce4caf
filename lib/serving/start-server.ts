/**
 * The server: Node's own HTTP server in front of Next, since only the socket knows who is calling. It knows nothing
 * of the application but its database, its worker threads and its jobs, which it opens and closes.
 */
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { applyMigrations } from '@/db/apply-migrations';
import { closeDatabase } from '@/db/client';
import { closeAssessmentPool } from '@/lib/assessments/assessment-pool';
import { checkEnvOrExit, type Env } from '@/lib/env';
import { JOB_HANDLERS } from '@/lib/jobs/handlers';
import { startChores } from '@/lib/jobs/run-chores';
import { runJobs } from '@/lib/jobs/run-jobs';
import { log } from '@/lib/log';
import { endDemonstrationSessions } from '@/lib/people/demonstration-only';
import { closeRefitPool } from '@/lib/refits/refit-pool';
import { startLocalStorage, stopLocalStorage } from '@/storage/local-server';
import { bodyBounds, LONGEST_BODY_MS } from './body-bounds';
import { withLateAnswer } from './late-answer';
import { limitBodyTime } from './limit-body-time';
import { lingerBeforeEnd } from './linger';
import { logRequest } from './log-request';
import { PEER_HEADER, peerAddress } from './peer';
import { refuseBrokenRequest, refuseUnreadablePath } from './refuse-broken-request';
import { policyOfAddress, securityHeaders } from './security-headers';
import { stopOnSignal } from './stop-on-signal';

type NextHandler = (request: IncomingMessage, response: ServerResponse) => Promise<void>;

/** Milliseconds: for the headers of a request, and for an idle connection. */
const HEADERS_TIMEOUT_MS = 15_000;
const IDLE_TIMEOUT_MS = 10_000;

/** Starts serving and resolves once calls are taken. Ends the process with a sentence where it cannot. */
export async function startServer({ development }: { development: boolean }): Promise<void> {
  // Before Next is loaded, which decides by it which build of React it takes.
  Object.assign(process.env, {
    NODE_ENV: development ? 'development' : 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    // The SDK is pinned to a version that runs on this Node; what it says of later ones is no news here.
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
  });
  const env = checkEnvOrExit();
  const server = createServer();
  const [handle] = await Promise.all([
    prepareNext(server, env, development),
    prepareDatabase(env),
    startLocalStorage(),
  ]);
  await (env.demo ? loadDemonstration() : endDemonstrationSessions());
  answerWith(server, handle, env);
  await listen(server, env);
  const chores = startChores();
  const jobs = runJobs(JOB_HANDLERS);
  stopOnSignal(server, async () => {
    await Promise.all([chores.stop(), jobs.stop()]);
    await Promise.all([closeAssessmentPool(), closeRefitPool()]);
    await closeDatabase();
    await stopLocalStorage();
  });
  announce(server, env);
}

async function prepareDatabase({ databaseUrl }: Env): Promise<void> {
  try {
    await applyMigrations();
  } catch (error) {
    log().error({ err: error }, 'the database could not be prepared');
    const [, scheme = ''] = /^(\w+:)/.exec(databaseUrl) ?? [];
    const place = scheme === 'file:' ? databaseUrl.slice(scheme.length) : `the ${scheme} address`;
    process.stderr.write(
      `The database at ${place} cannot be opened or brought up to date. CURVEKEEP_DATA_DIR must be a folder that can be written to, DATABASE_URL a libSQL database.\n`,
    );
    process.exit(1);
  }
}

/** Loaded only here: elsewhere the server knows nothing of it. */
async function loadDemonstration(): Promise<void> {
  const { loadScenario, NotForDemonstration } = await import('@/db/seed/load-scenario');
  const { attachDemonstrationFiles } = await import('@/db/seed/attach-files');
  try {
    await loadScenario();
  } catch (error) {
    if (!(error instanceof NotForDemonstration)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exit(1);
  }
  await attachDemonstrationFiles();
}

async function prepareNext(server: Server, env: Env, development: boolean): Promise<NextHandler> {
  const { default: next } = await import('next');
  const app = next({
    dev: development,
    dir: process.cwd(),
    hostname: env.host,
    port: env.port,
    httpServer: server,
  });
  await app.prepare();
  return app.getRequestHandler();
}

function answerWith(server: Server, handle: NextHandler, env: Env): void {
  const headers = securityHeaders(env.appUrl);
  const answer = (request: IncomingMessage, response: ServerResponse) => {
    const forwardedFor = request.headers['x-forwarded-for'];
    const claimed = Array.isArray(forwardedFor) ? forwardedFor.join(',') : forwardedFor;
    request.headers[PEER_HEADER] = peerAddress(request.socket.remoteAddress, claimed, env.trustedProxies);
    for (const [name, value] of Object.entries(headers)) response.setHeader(name, value);
    response.setHeader('Content-Security-Policy', policyOfAddress(request.url ?? ''));
    logRequest(request, response);
    limitBodyTime(request, response, (error) => refuseBrokenRequest(error, request.socket, headers));
    if (refuseUnreadablePath(request, response)) return;
    withLateAnswer(request, response, () => handle(request, response)).catch((error: unknown) => {
      log().error({ err: error }, 'a request failed');
      response.destroy();
    });
  };
  server.headersTimeout = HEADERS_TIMEOUT_MS;
  server.requestTimeout = LONGEST_BODY_MS;
  server.keepAliveTimeout = IDLE_TIMEOUT_MS;
  server.on('request', (request: IncomingMessage, response: ServerResponse) => {
    lingerBeforeEnd(request, response);
    answer(request, response);
  });
  server.on('checkContinue', (request: IncomingMessage, response: ServerResponse) => {
    // A caller that asks before it sends is not told to send what would be refused; nothing of it is on its way then.
    if (Number(request.headers['content-length'] ?? 0) <= bodyBounds(request.url ?? '').mostBytes) {
      response.writeContinue();
      lingerBeforeEnd(request, response);
    }
    answer(request, response);
  });
  server.on('clientError', (error, socket) => refuseBrokenRequest(error, socket, headers));
}

function listen(server: Server, { host, port }: Env): Promise<void> {
  return new Promise((resolve) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      const reason =
        error.code === 'EADDRINUSE'
          ? 'is taken; set PORT to another number'
          : `cannot be used (${error.code})`;
      process.stderr.write(`Port ${port} on ${host} ${reason}.\n`);
      process.exit(1);
    });
    server.listen(port, host, resolve);
  });
}

function announce(server: Server, { host, demo }: Env): void {
  const { port } = server.address() as AddressInfo;
  const url = `http://${host.includes(':') ? `[${host}]` : host}:${port}`;
  log().info({ url }, 'listening');
  if (demo) process.stdout.write(`\nCurvekeep is ready: ${url}\nStop it with Ctrl+C.\n\n`);
}
