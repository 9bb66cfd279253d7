import { volumeUncertainty } from '@/lib/engine';
import { CADMIUM, FLUORESCEIN, THERMOMETER, WEIGHTED } from '../datasets/lines';
import { lineOf, readBack } from '../line-of';
import { type CheckRow, type CheckSource, sourceOf } from '../types';

const MILLER =
  'J. N. Miller and J. C. Miller, Statistics and Chemometrics for Analytical Chemistry, chapter 5';

function cadmium(): CheckSource {
  const answer = lineOf(CADMIUM, [CADMIUM.sample]);
  return sourceOf({
    id: 'cadmium',
    title: 'A straight line, and a sample read twice',
    source: 'EURACHEM/CITAC Guide CG 4 (2012), examples A5 and A1',
    kind: 'seen in print',
    rows: [
      ['slope', '0.2410', () => answer().curve.slope.value],
      ['standard deviation of the slope', '0.0050', () => answer().curve.slope.u],
      ['intercept', '0.0087', () => answer().curve.intercept.value],
      ['standard deviation of the intercept', '0.0029', () => answer().curve.intercept.u],
      ['residual standard deviation', '0.005486', () => answer().curve.residualSd, 'typed from memory'],
      ['r', '0.997', () => Math.sqrt(answer().curve.rSquared), 'typed from memory'],
      ['concentration of the sample, mg/L', '0.260', () => readBack(answer(), 0).value],
      ['standard uncertainty of the concentration, mg/L', '0.018', () => readBack(answer(), 0).u],
      [
        'standard uncertainty of 100 mL in a flask, mL',
        '0.07',
        () => volumeUncertainty(100, { toleranceMl: 0.1, repeatabilityMl: 0.02, temperatureRangeK: 4 }),
      ],
    ],
  });
}

function fluorescein(): CheckSource {
  const signals = [
    { y0: 2.9, x0: '0.72', s: '0.26', half: '0.68' },
    { y0: 13.5, x0: '6.21', s: '0.24', half: '0.62' },
    { y0: 23, x0: '11.13', s: '0.26', half: '0.68' },
  ];
  const answer = lineOf(
    FLUORESCEIN,
    signals.map(({ y0 }) => [y0]),
  );
  const readings = signals.flatMap(({ y0, x0, s, half }, i): readonly CheckRow[] => [
    [`concentration at ${y0}`, x0, () => readBack(answer(), i).value],
    [`standard deviation of the concentration at ${y0}`, s, () => readBack(answer(), i).u],
    [`half the 95 % interval at ${y0}`, half, () => answer().unknowns[i]?.concentration?.U ?? NaN],
  ]);
  return sourceOf({
    id: 'fluorescein',
    title: 'The fluorescein line, read back at three signals',
    source: `${MILLER}; the data seen in print`,
    kind: 'typed from memory',
    rows: [
      ['slope', '1.93', () => answer().curve.slope.value],
      ['intercept', '1.52', () => answer().curve.intercept.value],
      ['r', '0.9989', () => Math.sqrt(answer().curve.rSquared)],
      ['standard deviation of the slope', '0.0409', () => answer().curve.slope.u],
      ...readings,
    ],
  });
}

function weighted(): CheckSource {
  const signals = [[0.1], [0.6]];
  const { x, y, s } = WEIGHTED;
  const heavy = lineOf({ x, y, weights: s.map((sd) => 1 / sd ** 2) }, signals);
  const plain = lineOf({ x, y }, signals);
  return sourceOf({
    id: 'weighted',
    title: 'One set of data, weighted and not',
    source: MILLER,
    kind: 'seen in print',
    rows: [
      ['weighted: slope', '0.0738', () => heavy().curve.slope.value],
      ['weighted: intercept', '0.0091', () => heavy().curve.intercept.value],
      ['weighted: concentration at 0.100', '1.23', () => readBack(heavy(), 0).value],
      ['weighted: concentration at 0.600', '8.01', () => readBack(heavy(), 1).value],
      ['unweighted: slope', '0.0725', () => plain().curve.slope.value, 'typed from memory'],
      ['unweighted: intercept', '0.0133', () => plain().curve.intercept.value, 'typed from memory'],
      ['unweighted: concentration at 0.100', '1.20', () => readBack(plain(), 0).value, 'typed from memory'],
      ['unweighted: concentration at 0.600', '8.09', () => readBack(plain(), 1).value, 'typed from memory'],
    ],
  });
}

function thermometer(): CheckSource {
  const at104 = lineOf(THERMOMETER, [[104]]);
  const at100 = lineOf(THERMOMETER, [[100]], { confidence: 0.9 });
  const end = (answer: typeof at104, i: 0 | 1) => answer().unknowns[0]?.fieller?.[i] ?? NaN;
  return sourceOf({
    id: 'thermometer',
    title: "Fieller's interval of a value read back",
    source: 'F. A. Graybill and H. K. Iyer, Regression Analysis: Concepts and Applications (1994)',
    kind: 'seen in print',
    rows: [
      ['true temperature at 104', '103.995', () => readBack(at104(), 0).value],
      ['lower end at 104, 95 %', '103.4', () => end(at104, 0)],
      ['upper end at 104, 95 %', '104.6', () => end(at104, 1)],
      ['true temperature at 100', '100.1', () => readBack(at100(), 0).value],
      ['lower end at 100, 90 %', '99.63', () => end(at100, 0)],
      ['upper end at 100, 90 %', '100.59', () => end(at100, 1)],
    ],
  });
}

/** Calibration lines of guides and textbooks. */
export function publishedLines(): readonly CheckSource[] {
  return [cadmium(), fluorescein(), weighted(), thermometer()];
}
