/**
 * Where objects are kept, and the one client that talks to it. Next bundles route handlers apart from the server that
 * started the local store; both must meet the same one, so it hangs on globalThis.
 */
import { S3Client } from '@aws-sdk/client-s3';
import { env } from '@/lib/env';

/** Milliseconds for a connection, and for silence on one. */
const CONNECT_MS = 5_000;
const SILENCE_MS = 30_000;

/** The one account that the local server knows; it checks no signature. */
const LOCAL_KEYS = { accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' };

interface Connection {
  /** address of the local store, while it runs */
  localEndpoint?: string;
  client?: S3Client;
}

const KEY = Symbol.for('curvekeep.storage');
const shared = globalThis as typeof globalThis & { [KEY]?: Connection };

/** The client of this process. Throws where there is no S3 service: neither S3_ENDPOINT nor a local store that runs. */
export function s3(): S3Client {
  shared[KEY] ??= {};
  shared[KEY].client ??= connect(shared[KEY].localEndpoint);
  return shared[KEY].client;
}

/** Turns to the local store at an address, or away from it (`undefined`). */
export function turnToLocalEndpoint(localEndpoint: string | undefined): void {
  shared[KEY]?.client?.destroy();
  shared[KEY] = { localEndpoint };
}

function connect(localEndpoint: string | undefined): S3Client {
  const { region, accessKeyId, secretAccessKey, ...settings } = env().s3;
  const endpoint = settings.endpoint ?? localEndpoint;
  if (endpoint === undefined)
    throw new Error('There is no store for objects: the local one was not started.');
  return new S3Client({
    endpoint,
    region,
    credentials: settings.endpoint === undefined ? LOCAL_KEYS : { accessKeyId, secretAccessKey },
    forcePathStyle: true,
    // The local server stores streamed bodies wrong, without an error, where the client adds checksums of its own.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    requestHandler: { connectionTimeout: CONNECT_MS, socketTimeout: SILENCE_MS },
  });
}
