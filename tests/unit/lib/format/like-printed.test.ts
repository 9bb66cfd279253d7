import { expect, test } from 'vitest';
import { formatLikePrinted } from '@/lib/format/like-printed';

test.each([
  [0.260166, '0.260', '0.2602'],
  [-0.0031, '-0.003', '\u22120.0031'],
  [10, '10', '10'],
  [19.4, '19', '19.4'],
  [0.884796396144385, '0.884796396144373', '0.884796396144385'],
  [4.2979684819994336e-4, '0.429796848199937E-03', '0.429796848199943E-03'],
  [-3.160818713450277e-15, '-0.316081871345029E-14', '\u22120.316081871345028E-14'],
  // another power of ten than the printed one is seen at once
  [4.29796848199943e-3, '0.429796848199937E-03', '0.00429796848199943'],
])('%d beside the printed %s is %s', (x, printed, text) => {
  expect(formatLikePrinted(x, printed)).toBe(text);
});
