import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { gunzipSync } from 'node:zlib';
import { expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type UnknownResult } from '@/lib/engine';

/*
 * Reference: fixtures/reference/mpmath-judge, random problems solved to fifty digits from the measurement model,
 * apart from this code. Expected numbers are texts of eighteen digits.
 */

interface ExpectedUnknown {
  readonly case: UnknownResult['reportCase'];
  readonly criticalValue: string;
  readonly measured?: string;
  readonly measuredU?: string;
  readonly value?: string;
  readonly u?: string;
  readonly U?: string;
  readonly k?: string;
  readonly degreesOfFreedom?: string;
  readonly fieller?: readonly [string, string] | null;
}
interface Problem {
  readonly number: number;
  /** Of the weighted design with its columns at unit length. */
  readonly condition: number;
  readonly request: CurveRequest;
  readonly expected: {
    readonly n: number;
    readonly degreesOfFreedom: number;
    readonly coefficients: readonly string[];
    /** Lower triangle by rows. */
    readonly covariance: readonly (readonly string[])[];
    readonly residualSd: string;
    readonly rSquared: string;
    readonly criticalValue: string;
    readonly unknowns: readonly ExpectedUnknown[];
  };
}

const FILE = new URL('../../../../fixtures/reference/mpmath-judge/problems.jsonl.gz', import.meta.url);
const problems = gunzipSync(readFileSync(fileURLToPath(FILE)))
  .toString('utf8')
  .trim()
  .split('\n')
  .map((line) => JSON.parse(line) as Problem);

/** What was found and what was expected. */
type Member = readonly [name: string, actual: unknown, expected: unknown];

function membersOfUnknown(i: number, actual: UnknownResult | undefined, expected: ExpectedUnknown): Member[] {
  const at = `unknowns[${i}]`;
  const always: Member[] = [
    [`${at}.reportCase`, actual?.reportCase, expected.case],
    [`${at}.criticalValue`, actual?.criticalValue, expected.criticalValue],
  ];
  const concentration = actual?.concentration;
  if (expected.value === undefined) return [...always, [`${at}.concentration`, concentration, null]];
  const names = ['value', 'u', 'U', 'k', 'degreesOfFreedom'] as const;
  const { fieller = null } = expected;
  return [
    ...always,
    [`${at}.measured.value`, actual?.measured?.value, expected.measured],
    [`${at}.measured.u`, actual?.measured?.u, expected.measuredU],
    ...names.map((name): Member => [`${at}.${name}`, concentration?.[name], expected[name]]),
    ...(fieller === null
      ? [[`${at}.fieller`, actual?.fieller, null] as const]
      : fieller.map((end, j): Member => [`${at}.fieller[${j}]`, actual?.fieller?.[j], end])),
  ];
}

function membersOf(problem: Problem): Member[] {
  const { curve, unknowns } = calculateStandardCurve(problem.request);
  const { expected } = problem;
  const coefficients = [curve.intercept.value, curve.slope.value, curve.quadratic?.value];
  return [
    ['n', curve.n, expected.n],
    ['degreesOfFreedom', curve.degreesOfFreedom, expected.degreesOfFreedom],
    ...expected.coefficients.map((value, i): Member => [`coefficients[${i}]`, coefficients[i], value]),
    ...expected.covariance.flatMap((row, i) =>
      row.flatMap((value, j): Member[] => [
        [`covariance[${i}][${j}]`, curve.covariance[i]?.[j], value],
        [`covariance[${j}][${i}]`, curve.covariance[j]?.[i], value],
      ]),
    ),
    ['residualSd', curve.residualSd, expected.residualSd],
    ['rSquared', curve.rSquared, expected.rSquared],
    ['criticalValue', curve.criticalValue, expected.criticalValue],
    ...expected.unknowns.flatMap((unknown, i) => membersOfUnknown(i, unknowns[i], unknown)),
  ];
}

/** 1e-10 of the expected number, or 1e-14 times the condition number of the design where that is more. */
function misses([, actual, expected]: Member, condition: number): boolean {
  const number = typeof expected === 'string' ? Number(expected) : NaN;
  if (typeof actual !== 'number' || Number.isNaN(number)) return actual !== expected;
  const allowed = Math.max(1e-10, 1e-14 * condition) * Math.abs(number);
  return !(Math.abs(actual - number) <= allowed);
}

function wrongIn(problem: Problem): string[] {
  return membersOf(problem)
    .filter((member) => misses(member, problem.condition))
    .map(([name, actual, expected]) => `problem ${problem.number}, ${name}: ${actual}, not ${expected}`);
}

const kindOf = ({ request }: Problem) => `${request.model}, weighting ${request.weighting}`;
const kinds = [...new Set(problems.map(kindOf))];

test('there are problems of every model and weighting', () => {
  expect(problems).toHaveLength(2400);
  expect(kinds).toHaveLength(24);
});

test.each(kinds)('%s: random problems come out as they do to fifty digits', (kind) => {
  expect(problems.filter((problem) => kindOf(problem) === kind).flatMap(wrongIn)).toEqual([]);
});
