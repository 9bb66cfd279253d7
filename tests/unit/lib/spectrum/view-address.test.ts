import { describe, expect, test } from 'vitest';
import { spectrumRule, textsOfRule } from '@/lib/schemas/spectrum-rule';
import { spectraInWords } from '@/lib/spectrum/spectra-in-words';
import { chosenSpectra, readViewAddress, spectrumKey, writeViewAddress } from '@/lib/spectrum/view-address';

const ids = ['0a1b2c3d-4e5f-4a6b-8c7d-9e0f1a2b3c4d', 'ffffffff-4e5f-4a6b-8c7d-9e0f1a2b3c4d'];
const spectra = ids.map((id) => ({ id, voided: false }));

describe('the address of a view', () => {
  test.each([
    { kind: 'interpolated', wavelengthNm: 510 },
    { kind: 'point', wavelengthNm: 509.5, minusNm: 700 },
    { kind: 'bandMean', wavelengthNm: 510, halfWidthNm: 2 },
    { kind: 'windowMaximum', fromNm: 450, toNm: 550, minusNm: 700 },
  ] as const)('holds %j and gives it back', (rule) => {
    const keys = ids.map(spectrumKey);
    const search = writeViewAddress({ keys, texts: textsOfRule(rule), aside: true });
    const view = readViewAddress(new URLSearchParams(search));
    expect(spectrumRule.parse(view.texts)).toEqual(rule);
    expect(view).toMatchObject({ keys, aside: true });
    expect(chosenSpectra(spectra, view.keys).map((spectrum) => spectrum.id)).toEqual(ids);
  });

  test('200 chosen spectra stay within 3,000 characters, so that every server takes the address', () => {
    const keys = Array.from({ length: 200 }, (_, i) => i.toString(16).padStart(12, '0'));
    expect(
      writeViewAddress({ keys, texts: textsOfRule({ kind: 'point' }), aside: false }).length,
    ).toBeLessThan(3000);
  });

  test('nobody has chosen: those in use; none chosen: none', () => {
    const one = { id: '11111111-4e5f-4a6b-8c7d-9e0f1a2b3c4d', voided: true };
    expect(chosenSpectra([...spectra, one], null)).toEqual(spectra);
    expect(chosenSpectra(spectra, readViewAddress(new URLSearchParams('s=')).keys)).toEqual([]);
  });

  test('nonsense in it is nothing chosen, not an error', () => {
    const view = readViewAddress(new URLSearchParams('s=zz,%3Cb%3E&rule=guess&at=abc'));
    expect(chosenSpectra(spectra, view.keys)).toEqual([]);
    expect(view.texts.rule).toBe('interpolated');
  });
});

describe('spectrumRule', () => {
  const texts = { rule: 'interpolated', at: '', half: '', from: '', to: '', minus: '' };
  test.each([
    [{ at: '' }, 'at'],
    [{ at: '1,234' }, 'at'],
    [{ at: '-5' }, 'at'],
    [{ rule: 'bandMean', at: '510', half: '0' }, 'half'],
    [{ rule: 'windowMaximum', from: '550', to: '450' }, 'to'],
    [{ at: '510', minus: 'blue' }, 'minus'],
  ])('refuses %j at its field', (part, field) => {
    const parsed = spectrumRule.safeParse({ ...texts, ...part });
    expect(parsed.success).toBe(false);
    expect(parsed.error?.issues.map((issue) => issue.path[0])).toContain(field);
  });

  test('takes a decimal comma', () => {
    expect(spectrumRule.parse({ ...texts, at: '509,5' })).toEqual({
      kind: 'interpolated',
      wavelengthNm: 509.5,
    });
  });
});

test.each([
  [0, [], 'No spectra yet'],
  [1, [{ fromNm: 510, toNm: 510 }], 'One spectrum, 510 nm'],
  [
    7,
    [
      { fromNm: 400, toNm: 650 },
      { fromNm: 450, toNm: 700 },
    ],
    'Seven spectra, 400\u2013700 nm',
  ],
  [13, [{ fromNm: 190.25, toNm: 1100 }], '13 spectra, 190.25\u20131100 nm'],
])('%i spectra are said in words', (count, spans, words) => {
  expect(spectraInWords(count, spans)).toBe(words);
});
