import { describe, expect, it } from 'vitest';
import { readEnv } from '@/lib/env';

function settingsOf(variables: Record<string, string>) {
  const read = readEnv(variables);
  return read.ok ? read.env.s3 : read.problems;
}

describe('the settings of the store', () => {
  it('are those of a local one where nothing is set', () => {
    expect(settingsOf({})).toMatchObject({ endpoint: undefined, bucket: 'curvekeep' });
  });

  it('name a service with its keys', () => {
    const variables = {
      S3_ENDPOINT: 'https://s3.example.org',
      S3_BUCKET: 'lab-objects',
      S3_REGION: 'eu-1',
      S3_ACCESS_KEY_ID: 'id',
      S3_SECRET_ACCESS_KEY: 'secret',
    };
    expect(settingsOf(variables)).toEqual({
      endpoint: 'https://s3.example.org',
      bucket: 'lab-objects',
      region: 'eu-1',
      accessKeyId: 'id',
      secretAccessKey: 'secret',
    });
  });

  it.each([
    [{ S3_ENDPOINT: 's3.example.org' }, 'S3_ENDPOINT must be'],
    [{ S3_ENDPOINT: 'https://s3.example.org' }, 'S3_ENDPOINT needs S3_ACCESS_KEY_ID'],
    [{ S3_BUCKET: 'Not A Bucket' }, 'S3_BUCKET must be'],
  ])('%j is named with what would be right', (variables, problem) => {
    const problems = settingsOf(variables as Record<string, string>);
    expect(Array.isArray(problems) && problems.join(' ')).toContain(problem);
  });
});
