import { setTimeout as sleep } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { admitReading, readLimitHeaders, readsPerMinute } from '@/lib/serving/admit-reading';
import { holdWriter } from '@/tests/support/hold-writer';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();
const NOW = 1_900_000_000_000;

describe('reading', () => {
  it('is let in 600 times a minute for an address, and again when the minute is over', async () => {
    for (let i = 0; i < 600; i++) {
      const admission = await admitReading('192.0.2.1', NOW + i);
      expect(admission).toMatchObject({ admitted: true, quota: { left: 599 - i } });
    }
    expect(await admitReading('192.0.2.1', NOW + 10_000)).toEqual({
      admitted: false,
      quota: { limit: 600, left: 0, resetSeconds: 50 },
    });
    expect(await admitReading('192.0.2.2', NOW + 10_000)).toMatchObject({ admitted: true });
    expect(await admitReading('192.0.2.1', NOW + 61_000)).toMatchObject({ admitted: true });
  });

  it('does not wait for a long write, and is counted when its turn comes', async () => {
    const release = await holdWriter();
    expect(await admitReading('192.0.2.3', NOW)).toBeNull();
    await release();
    await sleep(50);
    expect(await admitReading('192.0.2.3', NOW)).toMatchObject({ quota: { left: 598 } });
  });

  it('says its limit in headers, ten times higher in the demonstration', () => {
    expect(readLimitHeaders({ limit: 600, left: 12, resetSeconds: 7 })).toEqual({
      'RateLimit-Policy': '"reads";q=600;w=60',
      RateLimit: '"reads";r=12;t=7',
    });
    expect(readsPerMinute(true)).toBe(6000);
  });
});
