import { z } from 'zod';
import {
  CONCENTRATION_UNIT_NAMES,
  type CurveAnswer,
  type DirectAnswer,
  FLAGS,
  type FlagCode,
  type LimitsAnswer,
} from '@/lib/engine';

/*
 * What the public calculations answer: the engine's own answers, member by member. Strict, so that a member the
 * engine gains without a line here fails the test that holds real answers against the published document.
 */

const number = z.number();
const nullable = z.number().nullable();
const text = z.string();
const pair = z.tuple([number, number]);
const valueWithU = z.strictObject({ value: number, u: number });
const unit = z.enum(CONCENTRATION_UNIT_NAMES);
const model = z.enum(['linear', 'proportional', 'quadratic']);
const weighting = z.enum(['none', '1/x', '1/x2', '1/y', '1/y2', 'varianceFunction', 'replicates', 'given']);

const flag = z.strictObject({
  code: z.enum(Object.keys(FLAGS) as [FlagCode]),
  level: z.enum(['note', 'warn', 'stop']),
  message: text,
  value: number.optional(),
  limit: number.optional(),
});

const workingStep = z.strictObject({
  id: text,
  label: text,
  symbol: text,
  formula: text,
  substituted: text,
  value: z.union([number, text]),
  unit: text,
  source: text,
  inputs: z.array(text),
});

const reason = z.strictObject({ reason: text });
const test = z.union([
  z.strictObject({
    statistic: number,
    df1: number,
    df2: number.optional(),
    p: number,
    critical: number,
    passed: z.boolean(),
    verdict: text,
  }),
  reason,
]);

const limit = z.strictObject({
  name: text,
  kind: z.enum(['critical', 'detection', 'identification', 'quantification']),
  value: number,
  basis: text,
  formula: text.optional(),
  alpha: nullable.optional(),
  beta: nullable.optional(),
  source: text.optional(),
});

const point = z.strictObject({
  name: text,
  role: z.enum(['standard', 'blank']),
  standardIndex: nullable,
  replicate: number,
  concentration: number,
  pathLengthMm: number,
  absorbanceAsRead: nullable,
  censored: text.optional(),
  absorbance: nullable,
  weight: number,
  fitted: number,
  residual: nullable,
  backCalculated: nullable,
  relativeErrorPercent: nullable,
  leverage: nullable,
  standardisedResidual: nullable.optional(),
  cooksDistance: nullable,
  excluded: z.literal(true).optional(),
  excludedBecause: z.enum(['request', 'censored', 'zeroWithReciprocalWeights']).optional(),
});

const level = z.strictObject({
  concentration: number,
  readings: number,
  meanAbsorbance: number,
  meanBackCalculated: nullable,
  relativeErrorPercent: nullable,
});

const judgements = z.strictObject({
  weighting: z.strictObject({
    advised: weighting.nullable(),
    inUse: weighting,
    agrees: z.boolean(),
    basis: z.enum(['replicates', 'residuals', 'nothing']),
    sentence: text,
  }),
  varianceFunction: z.union([
    z.strictObject({
      s0: number,
      k: number,
      degreesOfFreedom: number,
      adviceOnly: z.boolean(),
      pConstant: number,
    }),
    reason,
  ]),
  outliers: z.array(
    z.strictObject({
      test: z.enum(['Grubbs', 'Dixon']),
      among: z.enum(['replicates', 'residuals']),
      name: text,
      standardIndex: nullable,
      replicate: number,
      concentration: number,
      n: number,
      statistic: number,
      critical: number,
      confidence: z.union([z.literal(0.95), z.literal(0.99)]),
      sentence: text,
    }),
  ),
  interceptSize: z
    .strictObject({ asConcentration: number, halfLowest: number, passed: z.boolean(), verdict: text })
    .nullable(),
});

const curve = z.strictObject({
  model,
  weighting,
  unit,
  confidence: number,
  n: number,
  degreesOfFreedom: number,
  intercept: valueWithU,
  slope: valueWithU,
  quadratic: valueWithU.optional(),
  covariance: z.array(z.array(number)),
  residualSd: number,
  rSquared: number,
  relativeStandardErrorPercent: nullable,
  meanConcentration: number,
  sxx: number,
  range: z.strictObject({ min: number, max: number }),
  criticalValue: number,
  criticalValueReadings: number,
  molarAbsorptivity: z
    .strictObject({ value: number, u: number, unit: z.literal('L/(mol cm)'), covers: text })
    .optional(),
  tests: z.strictObject({
    lackOfFit: test,
    mandel: test,
    intercept: test,
    homogeneity: test,
    cochran: test.optional(),
    levene: test.optional(),
  }),
  judgements: judgements.optional(),
  limits: z.array(limit),
  points: z.array(point),
  levels: z.array(level),
  flags: z.array(flag),
  working: z.array(workingStep),
});

const budgetLine = z.strictObject({
  source: text,
  u: number,
  share: number,
  inputU: number.optional(),
  inputUnit: text.optional(),
  sensitivity: number.optional(),
  degreesOfFreedom: nullable.optional(),
  sharesS: z.literal(true).optional(),
});

const dilutionAdvice = z.strictObject({
  factor: number,
  atLeast: z.boolean(),
  expectedAbsorbance: nullable,
  by: z.array(z.strictObject({ takenMl: number, toMl: number })).optional(),
  fromWing: z.literal(true).optional(),
});

const result = z.strictObject({
  name: text,
  absorbanceAsRead: nullable,
  absorbanceAtLeast: nullable,
  absorbance: nullable,
  transmittance: nullable,
  measured: valueWithU.nullable(),
  dilutionFactor: valueWithU,
  recovery: valueWithU.optional(),
  concentration: z
    .strictObject({
      value: number,
      u: number,
      U: number,
      k: number,
      degreesOfFreedom: nullable,
      interval: pair,
      unit,
    })
    .nullable(),
  computed: nullable,
  budget: z.array(budgetLine),
  reportCase: z.enum([
    'notQuantified',
    'aboveTopStandard',
    'value',
    'belowLowestStandard',
    'belowCriticalValue',
  ]),
  report: text,
  flags: z.array(flag),
  advice: text.optional(),
  dilutionAdvice: dilutionAdvice.optional(),
  working: z.array(workingStep),
});

export const standardCurveAnswer = z.strictObject({
  engine: text,
  curve,
  unknowns: z.array(result.extend({ fieller: pair.nullable(), criticalValue: number })),
}) satisfies z.ZodType<CurveAnswer>;

export const knownAbsorptivityAnswer = z.strictObject({
  engine: text,
  basis: text,
  flags: z.array(flag),
  working: z.array(workingStep),
  unknowns: z.array(result.extend({ fieller: z.null(), criticalValue: nullable })),
}) satisfies z.ZodType<DirectAnswer>;

export const limitsAnswer = z.strictObject({
  engine: text,
  unit,
  limits: z.array(limit),
  notMade: z.array(z.strictObject({ name: text, reason: text })),
  flags: z.array(flag),
}) satisfies z.ZodType<LimitsAnswer>;
