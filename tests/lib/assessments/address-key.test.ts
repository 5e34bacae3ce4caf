import { describe, expect, it } from 'vitest';
import { addressKey, countedAs } from '@/lib/assessments/address-key';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

describe('the key of an address', () => {
  it.each([
    ['192.0.2.7', '192.0.2.7'],
    ['::ffff:192.0.2.7', '192.0.2.7'],
    ['2001:db8::1', '2001:db8:0:0::/64'],
    ['2001:DB8:0:0:ffff::1', '2001:db8:0:0::/64'],
    ['2001:db8:0:1::1', '2001:db8:0:1::/64'],
    ['fe80::1%eth0', 'fe80:0:0:0::/64'],
    ['::1', '0:0:0:0::/64'],
    ['64:ff9b::192.0.2.7', '64:ff9b:0:0::/64'],
    ['nonsense', 'unknown'],
    ['', 'unknown'],
  ])('%s counts as %s', (address, counted) => {
    expect(countedAs(address)).toBe(counted);
  });

  it('is the same for one caller, differs between callers and does not show the address', async () => {
    const key = await addressKey('2001:db8::1');
    expect(await addressKey('2001:db8::2')).toBe(key);
    expect(await addressKey('2001:db8:1::1')).not.toBe(key);
    expect(key).toMatch(/^[\w-]{22}$/);
  });
});
