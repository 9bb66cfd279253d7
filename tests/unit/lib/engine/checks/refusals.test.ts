import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, ENGINE_ERRORS, EngineError } from '@/lib/engine';
import { request, standardsOf, unknown } from '../requests';

const x = [1, 2, 4, 6, 8];
const y = [0.1, 0.2, 0.4, 0.6, 0.8];
const standards = standardsOf(x, y);
const withFirst = (changes: object) => [
  { ...standards[0], ...changes } as (typeof standards)[0],
  ...standards.slice(1),
];
const diluted = (takenMl: number, toMl: number, more: object = {}) => [
  unknown([0.3], { dilution: [{ takenMl, toMl, ...more }] }),
];

const weighed = (takenG: number, toG: number, more: object = {}) => [
  unknown([0.3], { dilution: [{ takenG, toG, ...more }] }),
];

const REFUSALS: readonly [string, Partial<CurveRequest>, string | undefined][] = [
  ['NO_STANDARDS', { standards: [] }, '/standards'],
  ['TOO_FEW_STANDARDS', { standards: standardsOf([1, 2], [0.1, 0.2]) }, '/standards'],
  ['TOO_FEW_STANDARDS', { standards: standardsOf([1, 2, 2], [0.1, 0.2, 0.21]) }, '/standards'],
  ['TOO_FEW_STANDARDS', { model: 'proportional', standards: standardsOf([1], [0.1]) }, '/standards'],
  ['STANDARDS_COINCIDE', { standards: standardsOf([2, 2, 2], [0.1, 0.2, 0.3]) }, '/standards'],
  ['NOT_FINITE', { standards: withFirst({ readings: [NaN] }) }, '/standards/0/readings/0'],
  ['NOT_FINITE', { standards: withFirst({ readings: [0.1, Infinity] }) }, '/standards/0/readings/1'],
  ['NOT_FINITE', { standards: withFirst({ concentration: NaN }) }, '/standards/0/concentration'],
  ['NOT_FINITE', { unknowns: [unknown([0.1]), unknown([-Infinity])] }, '/unknowns/1/readings/0'],
  ['NOT_FINITE', { confidence: NaN }, '/confidence'],
  ['NO_READINGS', { standards: withFirst({ readings: [] }) }, '/standards/0/readings'],
  ['NO_READINGS', { unknowns: [unknown([])] }, '/unknowns/0/readings'],
  ['NO_READINGS', { blank: { readings: [], use: 'subtract' } }, '/blank/readings'],
  ['CONCENTRATION_NEGATIVE', { standards: withFirst({ concentration: -1 }) }, '/standards/0/concentration'],
  [
    'READING_INDEX_UNKNOWN',
    { standards: withFirst({ excludedReadings: [1] }) },
    '/standards/0/excludedReadings',
  ],
  ['PATH_LENGTH_NOT_POSITIVE', { pathLengthMm: 0 }, '/pathLengthMm'],
  ['PATH_LENGTH_NOT_POSITIVE', { standards: withFirst({ pathLengthMm: -10 }) }, '/standards/0/pathLengthMm'],
  [
    'PATH_LENGTH_NOT_POSITIVE',
    { unknowns: [unknown([0.1], { pathLengthMm: 0 })] },
    '/unknowns/0/pathLengthMm',
  ],
  ['UNCERTAINTY_NEGATIVE', { standardsRelativeU: -0.01 }, '/standardsRelativeU'],
  [
    'UNCERTAINTY_NEGATIVE',
    { unknowns: [unknown([0.1], { pathLengthUMm: -1 })] },
    '/unknowns/0/pathLengthUMm',
  ],
  ['LIMIT_NOT_POSITIVE', { absorbanceLimit: 0 }, '/absorbanceLimit'],
  ['CONFIDENCE_OUT_OF_RANGE', { confidence: 1 }, '/confidence'],
  ['CONFIDENCE_OUT_OF_RANGE', { confidence: 95 }, '/confidence'],
  ['FORMULA_MASS_MISSING', { unit: 'mmol/L' }, '/formulaMass'],
  ['FORMULA_MASS_NOT_POSITIVE', { formulaMass: 0 }, '/formulaMass'],
  ['VOLUME_NOT_POSITIVE', { unknowns: diluted(0, 10) }, '/unknowns/0/dilution/0/takenMl'],
  ['VOLUME_NOT_POSITIVE', { unknowns: diluted(10, -1) }, '/unknowns/0/dilution/0/toMl'],
  ['DILUTION_BELOW_TAKEN', { unknowns: diluted(10, 9.99) }, '/unknowns/0/dilution/0/toMl'],
  [
    'VOLUME_U_TWICE',
    { unknowns: diluted(1, 10, { toUMl: 0.1, toWare: { toleranceMl: 0.1 } }) },
    '/unknowns/0/dilution/0/toWare',
  ],
  [
    'UNCERTAINTY_NEGATIVE',
    { unknowns: diluted(1, 10, { takenWare: { toleranceMl: -1 } }) },
    '/unknowns/0/dilution/0/takenWare/toleranceMl',
  ],
  ['MASS_NOT_POSITIVE', { unknowns: weighed(0, 10) }, '/unknowns/0/dilution/0/takenG'],
  ['MASS_NOT_POSITIVE', { unknowns: weighed(1, 0) }, '/unknowns/0/dilution/0/toG'],
  ['DILUTION_BELOW_TAKEN', { unknowns: weighed(10, 9) }, '/unknowns/0/dilution/0/toG'],
  ['UNCERTAINTY_NEGATIVE', { unknowns: weighed(1, 10, { toUG: -1 }) }, '/unknowns/0/dilution/0/toUG'],
  [
    'MASS_NOT_POSITIVE',
    { unknowns: weighed(1, 10, { densities: { takenGPerMl: 1, toGPerMl: 0 } }) },
    '/unknowns/0/dilution/0/densities/toGPerMl',
  ],
  [
    'UNCERTAINTY_NEGATIVE',
    { unknowns: weighed(1, 10, { densities: { takenGPerMl: 1, toGPerMl: 1, toUGPerMl: -1 } }) },
    '/unknowns/0/dilution/0/densities/toUGPerMl',
  ],
  ['RECOVERY_NOT_POSITIVE', { recovery: { value: 0, u: 0.01 } }, '/recovery/value'],
  [
    'UNCERTAINTY_NEGATIVE',
    { unknowns: [unknown([0.3], { recovery: { value: 0.9, u: -1 } })] },
    '/unknowns/0/recovery/u',
  ],
  [
    'ESTIMATE_NOT_POSITIVE',
    { unknowns: [unknown(['OVER'], { wingEstimate: 0 })] },
    '/unknowns/0/wingEstimate',
  ],
  [
    'UNCERTAINTY_NEGATIVE',
    { standardsShared: [{ source: 'purity', relativeU: -0.1 }] },
    '/standardsShared/0/relativeU',
  ],
  ['VOLUME_NOT_POSITIVE', { glassware: { pipettesMl: [1, 0], flasksMl: [10] } }, '/glassware/pipettesMl/1'],
  [
    'BLANK_LEVEL_THROUGH_ZERO',
    { model: 'proportional', blank: { readings: [0.01], use: 'level' } },
    '/blank/use',
  ],
  [
    'BLANK_PATH_MISSING',
    { blank: { readings: [0.01], use: 'subtract' }, standards: withFirst({ pathLengthMm: 50 }) },
    '/standards/0/readings/0',
  ],
  [
    'BLANK_PATH_MISSING',
    { blank: { readings: [0.01], use: 'subtract' }, unknowns: [unknown([0.1], { pathLengthMm: 50 })] },
    '/unknowns/0',
  ],
  ['BLANK_CENSORED', { blank: { readings: [0.01, 'OVER'], use: 'subtract' } }, '/blank/readings/1'],
  ['VARIANCE_FUNCTION_MISSING', { weighting: 'varianceFunction' }, '/varianceFunction'],
  ['WEIGHT_MISSING', { weighting: 'given' }, '/standards/0/weight'],
  ['WEIGHT_NOT_POSITIVE', { standards: withFirst({ weight: 0 }) }, '/standards/0/weight'],
  [
    'WEIGHT_NOT_POSITIVE',
    { weighting: 'varianceFunction', varianceFunction: { s0: 0, k: 0 } },
    '/varianceFunction/s0',
  ],
  [
    'FITTED_NOT_POSITIVE',
    { weighting: '1/y', standards: standardsOf([0, 1, 2, 3], [-0.02, 0.1, 0.2, 0.3]) },
    '/weighting',
  ],
  ['REPLICATES_TOO_FEW', { weighting: 'replicates' }, '/weighting'],
  [
    'REPLICATES_WITHOUT_SPREAD',
    {
      weighting: 'replicates',
      standards: [1, 2, 3].map((c) => ({ concentration: c, readings: Array<number>(4).fill(c / 10) })),
    },
    '/weighting',
  ],
  ['ZERO_SLOPE', { standards: standardsOf(x, [0.1, 0.1, 0.1, 0.1, 0.1]) }, '/standards'],
  ['QUADRATIC_LEVELS', { model: 'quadratic' }, '/standards'],
  [
    'CURVE_TURNS',
    { model: 'quadratic', standards: standardsOf([0, 1, 2, 3, 4, 5], [0, 0.5, 0.8, 0.9, 0.8, 0.5]) },
    '/model',
  ],
  ['UNKNOWN_CHOICE', { unit: 'ppm' as CurveRequest['unit'] }, '/unit'],
  ['UNKNOWN_CHOICE', { weighting: '1/z' as CurveRequest['weighting'] }, '/weighting'],
];

describe('a request that cannot be calculated', () => {
  test.each(REFUSALS)('%s: %j', (code, changes, pointer) => {
    const calculate = () => calculateStandardCurve(request({ standards, ...changes }));
    expect(calculate).toThrow(expect.objectContaining({ name: 'EngineError', code, pointer }));
    expect(calculate).toThrow(EngineError);
  });

  const OF_SPECTRA = ['LENGTH_MISMATCH', 'SPECTRUM_', 'WAVELENGTH_', 'BAND_', 'NO_POINT_THERE'];
  const WITHOUT_A_CURVE = [
    'ABSORPTIVITY_NOT_POSITIVE',
    'SOURCE_MISSING',
    'STANDARD_WITHOUT_NUMBER',
    'BRACKET_REVERSED',
    'UNKNOWN_MISSING',
    'TRIALS_OUT_OF_RANGE',
    'SERIES_BROKEN',
  ];
  test('every error code of the catalogue has a case here, with the spectra or without a curve', () => {
    const met = new Set(REFUSALS.map(([code]) => code));
    const missing = Object.keys(ENGINE_ERRORS).filter(
      (code) =>
        !met.has(code) &&
        !WITHOUT_A_CURVE.includes(code) &&
        !OF_SPECTRA.some((start) => code.startsWith(start)),
    );
    expect(missing).toEqual([]);
  });
});

describe('a request on the right side of each limit', () => {
  test.each<[string, Partial<CurveRequest>]>([
    ['three levels', { standards: standardsOf([1, 2, 3], [0.1, 0.21, 0.3]) }],
    [
      'two levels and a blank level',
      { standards: standardsOf([1, 2], [0.1, 0.21]), blank: { readings: [0.001], use: 'level' } },
    ],
    ['two levels through zero', { model: 'proportional', standards: standardsOf([1, 2], [0.1, 0.21]) }],
    ['a dilution made up to what was taken', { unknowns: diluted(10, 10) }],
    ['a molar unit with its formula mass', { unit: 'mmol/L', formulaMass: 479.02 }],
    ['Greek mu for micro', { unit: '\u03bcg/mL' as CurveRequest['unit'] }],
    [
      'a blank for each path',
      {
        blank: { readings: [0.01], use: 'subtract', otherPaths: [{ pathLengthMm: 50, readings: [0.04] }] },
        standards: withFirst({ pathLengthMm: 50 }),
      },
    ],
  ])('%s', (_name, changes) => {
    expect(calculateStandardCurve(request({ standards, ...changes })).curve.n).toBeGreaterThan(1);
  });
});
