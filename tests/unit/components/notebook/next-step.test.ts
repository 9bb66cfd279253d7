import { expect, test } from 'vitest';
import { nextStep } from '@/components/notebook/next-step';

const NOTHING = {
  ...{ spectra: 0, curves: 0, absorptivities: 0, batches: 0, determinations: 0 },
  ...{ newestCurveId: null, newestCurveTitle: null, newestBatchId: null },
};
const words = (changes: Partial<typeof NOTHING>) => nextStep('/n', { ...NOTHING, ...changes }).words;

test('an absorptivity alone is enough to start a batch', () => {
  expect(words({})).toMatch(/^Nothing has been measured yet/);
  expect(nextStep('/n', { ...NOTHING, absorptivities: 1 })).toMatchObject({ href: '/n/batches/new' });
});

test('what determinations rest on is named', () => {
  const done = { batches: 1, determinations: 2 };
  expect(words({ ...done, curves: 1 })).toContain('read off 1 standard curve.');
  expect(words({ ...done, absorptivities: 1 })).toContain('read by 1 known absorptivity.');
  expect(words({ ...done, curves: 2, absorptivities: 1 })).toContain(
    'read off 2 standard curves and by 1 known absorptivity.',
  );
});
