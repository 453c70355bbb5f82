import { isIPv6 } from 'node:net';

/**
 * Whom tries are counted for: an IPv4 address, or the first 64 bits of an IPv6 one, since one household or server
 * usually holds all addresses behind them (RFC 6177) and could use a new one for each try.
 */
export function addressKey(address: string | undefined): string {
  if (!address) return 'unknown';
  const plain = address.replace(/^::ffff:(?=\d+\.)/i, '').replace(/%.*$/, '');
  if (!isIPv6(plain)) return plain;
  const [head = '', tail] = plain.toLowerCase().split('::');
  const groups = (part: string): string[] => (part === '' ? [] : part.split(':'));
  const [before, after] = [groups(head), groups(tail ?? '')];
  const zeros = tail === undefined ? 0 : Math.max(0, 8 - before.length - after.length);
  const all = [...before, ...Array.from({ length: zeros }, () => '0'), ...after];
  return `${all
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, ''))
    .join(':')}::/64`;
}
