/**
 * Who is at the other end of a connection. Only the socket knows; a header can be written by anybody. So the server
 * removes `PEER_HEADER` from what comes in and writes it anew, and the route handlers read it and nothing else.
 */
import { type BlockList, isIPv6 } from 'node:net';

export const PEER_HEADER = 'x-curvekeep-peer';

/**
 * The address of the caller: the socket's, or, where that belongs to a trusted proxy, the last address in
 * X-Forwarded-For that is not itself a trusted proxy.
 */
export function peerAddress(
  socketAddress: string | undefined,
  forwardedFor: string | undefined,
  trustedProxies: BlockList,
): string {
  const direct = plainAddress(socketAddress ?? '');
  if (!isTrusted(direct, trustedProxies)) return direct;
  const claimed = (forwardedFor ?? '').split(',').map((part) => plainAddress(part.trim()));
  return claimed.findLast((address) => address !== '' && !isTrusted(address, trustedProxies)) ?? direct;
}

function plainAddress(address: string): string {
  return address.replace(/^::ffff:(?=\d+\.\d+\.\d+\.\d+$)/i, '');
}

function isTrusted(address: string, trusted: BlockList): boolean {
  if (address === '') return false;
  try {
    return trusted.check(address, isIPv6(address) ? 'ipv6' : 'ipv4');
  } catch {
    return false; // not an address at all
  }
}
