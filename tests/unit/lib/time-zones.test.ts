import { expect, test } from 'vitest';
import { isTimeZone, ownTimeZone, timeZones } from '@/lib/time-zones';

test('lists each zone once, UTC first', () => {
  const zones = timeZones();
  expect(zones[0]).toBe('UTC');
  expect(new Set(zones).size).toBe(zones.length);
  expect(zones).toContain('Europe/London');
});

test('knows a zone from a word', () => {
  expect(isTimeZone('Europe/London')).toBe(true);
  expect(isTimeZone('Larkmoor')).toBe(false);
  expect(isTimeZone('')).toBe(false);
});

test('the own zone is one of the list', () => {
  expect(timeZones()).toContain(ownTimeZone());
});
