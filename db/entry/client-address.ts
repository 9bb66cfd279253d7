import { isIP } from 'node:net';

/** "192.0.2.7:4711" and "[2001:db8::7]:4711" without the port that some proxies add. */
function withoutPort(entry: string): string {
  const bracketed = /^\[([^\]]+)\](:\d+)?$/.exec(entry)?.[1];
  return bracketed ?? (/^[\d.]+:\d+$/.test(entry) ? entry.slice(0, entry.indexOf(':')) : entry);
}

/** The first 64 bits: whoever has one address of such a network has all of them. */
function network64(address: string): string {
  const [head = '', tail] = address.toLowerCase().split('::');
  const left = head === '' ? [] : head.split(':');
  const right = tail ? tail.split(':') : [];
  const zeros =
    tail === undefined ? [] : Array<string>(Math.max(0, 8 - left.length - right.length)).fill('0');
  const groups = [...left, ...zeros, ...right].slice(0, 4);
  return groups.map((group) => group.replace(/^0+(?=.)/, '')).join(':') + '::/64';
}

/**
 * The address a request came from, as far as it can be believed. Each proxy adds, at the right of
 * X-Forwarded-For, the address that it saw; so behind n proxies of our own the n-th entry from the right was
 * written by the outermost one, and everything left of it by whoever sent the request.
 *
 * @param proxies how many proxies of our own stand in front (TRUST_PROXY); with none, nothing is believed
 * @returns an IPv4 address, the /64 network of an IPv6 address, or null
 */
export function believedAddress(forwardedFor: string | null, proxies: number): string | null {
  if (proxies < 1 || !forwardedFor) return null;
  const entries = forwardedFor.split(',').map((entry) => entry.trim());
  const entry = withoutPort(entries[entries.length - proxies] ?? '');
  const inside = /^::ffff:([\d.]+)$/i.exec(entry)?.[1];
  if (inside && isIP(inside) === 4) return inside;
  const version = isIP(entry);
  return version === 0 ? null : version === 4 ? entry : network64(entry);
}
