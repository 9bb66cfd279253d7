import { expect, test } from 'vitest';
import { formatDate, formatDateTime } from '@/lib/format/dates';

test('dates stand in the zone of the laboratory, not of the server', () => {
  expect(formatDate('2026-12-01T23:30:00.000Z', 'Europe/London')).toBe('1 December 2026');
  expect(formatDate('2026-12-01T23:30:00.000Z', 'Asia/Tokyo')).toBe('2 December 2026');
  expect(formatDateTime('2026-07-01T12:00:05.000Z', 'Europe/London')).toBe('2026-07-01 13:00:05');
});
