import { describe, expect, test } from 'vitest';
import { believedAddress } from '@/db/entry/client-address';

// Addresses of documentation: RFC 5737 and RFC 3849.
describe('believedAddress', () => {
  test('believes nothing without a proxy of our own, whatever the header says', () => {
    expect(believedAddress('192.0.2.1', 0)).toBeNull();
    expect(believedAddress('192.0.2.1, 198.51.100.2', 0)).toBeNull();
  });

  test('takes the entry that the outermost own proxy wrote, counted from the right', () => {
    expect(believedAddress('203.0.113.9', 1)).toBe('203.0.113.9');
    expect(believedAddress('forged, 192.0.2.1, 203.0.113.9', 1)).toBe('203.0.113.9');
    expect(believedAddress('192.0.2.1, 203.0.113.9, 198.51.100.2', 2)).toBe('203.0.113.9');
  });

  test('believes nothing when entries are missing or are no addresses', () => {
    expect(believedAddress('203.0.113.9', 2)).toBeNull();
    expect(believedAddress('unknown', 1)).toBeNull();
    expect(believedAddress('203.0.113.999', 1)).toBeNull();
    expect(believedAddress('', 1)).toBeNull();
    expect(believedAddress(null, 1)).toBeNull();
  });

  test('passes over a port', () => {
    expect(believedAddress('203.0.113.9:4711', 1)).toBe('203.0.113.9');
    expect(believedAddress('[2001:db8:1:2::7]:4711', 1)).toBe('2001:db8:1:2::/64');
  });

  test('counts a network of IPv6 as one, however it is written', () => {
    const one = '2001:db8:0:2::/64';
    expect(believedAddress('2001:db8:0:2::7', 1)).toBe(one);
    expect(believedAddress('2001:0DB8:0000:0002:aaaa:bbbb:cccc:dddd', 1)).toBe(one);
    expect(believedAddress('2001:db8::1', 1)).toBe('2001:db8:0:0::/64');
    expect(believedAddress('::1', 1)).toBe('0:0:0:0::/64');
  });

  test('knows an IPv4 address inside an IPv6 one', () => {
    expect(believedAddress('::ffff:203.0.113.9', 1)).toBe('203.0.113.9');
  });
});
