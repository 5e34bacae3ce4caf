/**
 * The S3 server for an installation that has none: it keeps objects as files in the data folder. It checks no
 * signature, so it listens on this machine only; the application authorises every download itself.
 */
import { mkdir, rm } from 'node:fs/promises';
import path from 'node:path';
import S3rver, { type Middleware } from '@20minutes/s3rver';
import { env } from '@/lib/env';
import { turnToLocalEndpoint } from './connection';

let running: S3rver | undefined;

/** Starts it on a free port, unless S3_ENDPOINT names another service. */
export async function startLocalStorage(): Promise<void> {
  const { s3, dataDir } = env();
  if (s3.endpoint !== undefined || running) return;
  const directory = path.join(/* turbopackIgnore: true */ dataDir, 'objects');
  await mkdir(directory, { recursive: true });
  running = new S3rver({
    address: '127.0.0.1',
    port: 0,
    silent: true,
    directory,
    allowMismatchedSignatures: true,
    vhostBuckets: false,
    configureBuckets: [{ name: s3.bucket }],
  });
  running.middleware.unshift(abortingUploads(path.join(directory, s3.bucket)));
  // An upload that is broken off is an error here as well; the caller has it already.
  running.on('error', () => undefined);
  const { port } = await running.run();
  turnToLocalEndpoint(`http://127.0.0.1:${port}`);
}

/** Stops it, once what is under way is done. */
export async function stopLocalStorage(): Promise<void> {
  const stopping = running;
  running = undefined;
  turnToLocalEndpoint(undefined);
  // Idle connections that are kept open would hold it up.
  stopping?.httpServer?.closeIdleConnections();
  await stopping?.close();
}

/** AbortMultipartUpload, which the package lacks: without it the parts of a broken upload would stay for ever. */
function abortingUploads(bucketFolder: string): Middleware {
  return async (context, next) => {
    const { uploadId } = context.query;
    if (context.method !== 'DELETE' || typeof uploadId !== 'string') return next();
    // The package keeps parts at this place, under ids of this form.
    if (/^[0-9a-f]{32}$/.test(uploadId)) {
      await rm(path.join(bucketFolder, '._S3rver_uploads', uploadId), { recursive: true, force: true });
    }
    context.status = 204;
  };
}
