/** Under which key an address is counted: a keyed hash, so that the database holds no address. */
import { createHmac } from 'node:crypto';
import { isIPv4, isIPv6 } from 'node:net';
import { installKey } from '@/db/queries/computation-limits';

let key: Promise<Buffer> | undefined;

/** The key of an address in this installation. */
export async function addressKey(address: string): Promise<string> {
  key ??= installKey('address');
  // A failure is not kept: the next call asks again.
  key.catch(() => {
    key = undefined;
  });
  return createHmac('sha256', await key)
    .update(countedAs(address))
    .digest('base64url')
    .slice(0, 22);
}

/**
 * The part of an address that stands for one caller: an IPv4 address whole; of an IPv6 address the first 64 bits,
 * since a household or a laboratory is given that many addresses to choose from.
 */
export function countedAs(address: string): string {
  const plain = address.replace(/%.*$/, '').toLowerCase();
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/.exec(plain)?.[1] ?? plain;
  if (isIPv4(mapped)) return mapped;
  if (!isIPv6(mapped)) return 'unknown';
  return `${groupsOf(mapped).slice(0, 4).join(':')}::/64`;
}

/** The eight groups of an IPv6 address, without leading zeros. */
function groupsOf(address: string): string[] {
  const hexadecimal = address.replace(/(\d+)\.(\d+)\.(\d+)\.(\d+)$/, (_, a, b, c, d) =>
    [(Number(a) << 8) | Number(b), (Number(c) << 8) | Number(d)].map((n) => n.toString(16)).join(':'),
  );
  const [head = '', tail] = hexadecimal.split('::');
  const left = head === '' ? [] : head.split(':');
  const right = tail === undefined || tail === '' ? [] : tail.split(':');
  const middle = tail === undefined ? [] : Array.from({ length: 8 - left.length - right.length }, () => '0');
  return [...left, ...middle, ...right].map((group) => Number.parseInt(group, 16).toString(16));
}
