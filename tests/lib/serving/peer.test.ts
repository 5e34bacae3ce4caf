import { BlockList } from 'node:net';
import { describe, expect, it } from 'vitest';
import { peerAddress } from '@/lib/serving/peer';

const nobody = new BlockList();
const proxies = new BlockList();
proxies.addSubnet('10.0.0.0', 8, 'ipv4');

describe('the address of a caller', () => {
  it.each([
    ['the socket, where no proxy is trusted', '192.0.2.1', '203.0.113.9', nobody, '192.0.2.1'],
    ['the socket, where it is not the proxy', '192.0.2.1', '203.0.113.9', proxies, '192.0.2.1'],
    ['what the proxy says', '10.0.0.1', '203.0.113.9', proxies, '203.0.113.9'],
    ['what the proxy says, through an IPv6 socket', '::ffff:10.0.0.1', '203.0.113.9', proxies, '203.0.113.9'],
    [
      'the last that is not a proxy: what stands before it may be forged',
      '10.0.0.1',
      '1.2.3.4, 203.0.113.9, 10.0.0.2',
      proxies,
      '203.0.113.9',
    ],
    ['the proxy, where it says nothing', '10.0.0.1', undefined, proxies, '10.0.0.1'],
  ])('is %s', (_, socket, forwarded, trusted, expected) => {
    expect(peerAddress(socket, forwarded, trusted)).toBe(expected);
  });
});
