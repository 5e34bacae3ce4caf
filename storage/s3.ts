/** The three S3 calls that are needed, streamed in both directions. */
import type { Readable } from 'node:stream';
import { DeleteObjectCommand, GetObjectCommand, HeadBucketCommand } from '@aws-sdk/client-s3';
import { Upload } from '@aws-sdk/lib-storage';
import { env } from '@/lib/env';
import { s3 } from './connection';

/** The least that S3 takes for a part; two of them are in memory at a time. */
const PART_BYTES = 5 * 1024 * 1024;
const PARTS_AT_ONCE = 2;

/** Stores a stream of unknown length; where it fails, nothing of it stays. */
export async function putStream(key: string, body: Readable): Promise<void> {
  const upload = new Upload({
    client: s3(),
    params: { Bucket: env().s3.bucket, Key: key, Body: body, ContentType: 'application/octet-stream' },
    partSize: PART_BYTES,
    queueSize: PARTS_AT_ONCE,
    leavePartsOnError: false,
  });
  await upload.done();
}

/** The bytes of an object as a stream. Throws where there is no such object. */
export async function getStream(key: string): Promise<Readable> {
  const { Body } = await s3().send(new GetObjectCommand({ Bucket: env().s3.bucket, Key: key }));
  if (Body === undefined) throw new Error(`The object ${key} came without a body.`);
  return Body as Readable;
}

/** Removes an object; one that is not there is no error. */
export async function remove(key: string): Promise<void> {
  await s3().send(new DeleteObjectCommand({ Bucket: env().s3.bucket, Key: key }));
}

/** Throws where the bucket does not answer. */
export async function probe(): Promise<void> {
  await s3().send(new HeadBucketCommand({ Bucket: env().s3.bucket }));
}
