import type { CurveResult, TestAnswer } from '@/lib/engine';
import { formatDecimals, formatNumber, formatPercent } from '@/lib/format/number';

/** One judgement of a curve: what was looked at and what it says, in a sentence for a person at the bench. */
export interface JudgementLine {
  readonly key: string;
  readonly name: string;
  readonly tone: 'order' | 'decide' | 'plain';
  readonly sentence: string;
}

/** A test that was not made, and why. */
export interface UnmadeTest {
  readonly name: string;
  readonly reason: string;
}

const TEST_NAMES: Readonly<Record<keyof CurveResult['tests'], string>> = {
  lackOfFit: 'Lack of fit',
  mandel: 'Curvature (Mandel)',
  intercept: 'Intercept against zero',
  homogeneity: 'Scatter of the two ends (F)',
  cochran: 'No level scatters most (Cochran)',
  levene: 'Levels scatter alike (Levene)',
};
/** In the order that matters; the intercept's size stands behind its test. */
const TEST_ORDER = ['lackOfFit', 'mandel', 'intercept', 'homogeneity', 'cochran', 'levene'] as const;

const signedPercent = (percent: number) => `${percent > 0 ? '+' : ''}${formatPercent(percent)}`;
const plain = (value: number) => String(Number(value.toPrecision(6)));

/** Standards read back through the line they made: the judgement that a user of results can feel. */
function backCalculation({ levels, unit, relativeStandardErrorPercent: rse }: CurveResult): JudgementLine[] {
  const errors = levels.flatMap(({ concentration, relativeErrorPercent }) =>
    relativeErrorPercent === null ? [] : [{ concentration, percent: relativeErrorPercent }],
  );
  const [first, ...others] = errors;
  if (!first) return [];
  const worst = others.reduce((a, b) => (Math.abs(b.percent) > Math.abs(a.percent) ? b : a), first);
  const lowest = Math.min(...errors.map(({ concentration }) => concentration));
  const within = Math.abs(worst.percent) <= (worst.concentration === lowest ? 20 : 10);
  const overall =
    rse === null ? '' : ` Over all of them the relative standard error is ${formatPercent(rse)}.`;
  return [
    {
      key: 'backCalculation',
      name: 'Standards read back',
      tone: within ? 'order' : 'decide',
      sentence: `The line gives every standard back within ${formatPercent(Math.abs(worst.percent))} (${signedPercent(worst.percent)} at ${plain(worst.concentration)} ${unit}).${overall}`,
    },
  ];
}

/** The reading that lies furthest from the curve, in standard deviations of where it should lie. */
function residuals({ points, judgements }: CurveResult): JudgementLine[] {
  const known = points.flatMap((point) =>
    typeof point.standardisedResidual === 'number' ? [{ point, size: point.standardisedResidual }] : [],
  );
  const [first, ...others] = known;
  if (!first) return [];
  const worst = others.reduce((a, b) => (Math.abs(b.size) > Math.abs(a.size) ? b : a), first);
  const apart = judgements?.outliers.find(({ among }) => among === 'residuals');
  const usual = Math.abs(worst.size) <= 2 ? 'as scatter goes' : 'which scatter does now and then';
  return [
    {
      key: 'residuals',
      name: 'Residuals',
      tone: apart ? 'decide' : 'order',
      sentence:
        apart?.sentence ??
        `The reading furthest from the line is reading ${worst.point.replicate} of ${worst.point.name}, ${formatDecimals(Math.abs(worst.size), 1)} standard deviations away, ${usual}.`,
    },
  ];
}

function ofTest(key: keyof CurveResult['tests'], test: TestAnswer | undefined): JudgementLine[] {
  if (!test || test.reason !== undefined) return [];
  return [{ key, name: TEST_NAMES[key], tone: test.passed ? 'order' : 'decide', sentence: test.verdict }];
}

/** A free intercept may differ from zero; a line through zero may not have one. */
function intercept({ tests, model }: CurveResult): JudgementLine[] {
  return ofTest('intercept', tests.intercept).map((line) =>
    line.tone === 'order' || model === 'proportional'
      ? line
      : { ...line, tone: 'plain', sentence: `${line.sentence} A line through zero would not do here.` },
  );
}

function interceptSize({ judgements }: CurveResult): JudgementLine[] {
  const size = judgements?.interceptSize;
  if (!size) return [];
  const name = 'Intercept beside the lowest standard';
  return [{ key: 'interceptSize', name, tone: size.passed ? 'order' : 'decide', sentence: size.verdict }];
}

function range({ range: { min, max }, unit }: CurveResult): JudgementLine {
  return {
    key: 'range',
    name: 'Range',
    tone: 'plain',
    sentence: `Results are read off between ${plain(min)} and ${plain(max)} ${unit} in the measured solution, and nowhere else.`,
  };
}

function weighting({ judgements }: CurveResult): JudgementLine[] {
  const advice = judgements?.weighting;
  if (!advice) return [];
  const tone = advice.basis === 'nothing' ? 'plain' : advice.agrees ? 'order' : 'decide';
  return [{ key: 'weighting', name: 'Weighting', tone, sentence: advice.sentence }];
}

function outliersAmongReplicates({ judgements }: CurveResult): JudgementLine[] {
  return (judgements?.outliers ?? [])
    .filter(({ among }) => among === 'replicates')
    .map(({ test, sentence, standardIndex, replicate }) => ({
      key: `${test} ${standardIndex ?? 'blank'}.${replicate}`,
      name: `Replicates (${test})`,
      tone: 'decide',
      sentence,
    }));
}

function learnedVariance({ judgements }: CurveResult): JudgementLine[] {
  const learned = judgements?.varianceFunction;
  if (!learned || 'reason' in learned) return [];
  const { s0, k, degreesOfFreedom, adviceOnly } = learned;
  const law = `s(A)² = ${formatNumber(s0, 2)}² + (${formatNumber(k, 2)} A)²`;
  const few = adviceOnly ? ', too few to weight by: take it as advice' : '';
  return [
    {
      key: 'varianceFunction',
      name: 'Scatter of one reading',
      tone: 'plain',
      sentence: `The replicates scatter as ${law}, learned from ${degreesOfFreedom} degrees of freedom${few}.`,
    },
  ];
}

/**
 * Everything that judges a curve, in the order that matters: standards read back and residuals first, then lack of
 * fit and curvature, the intercept, the range, the scatter. r² is not among them: it is shown small and last.
 */
export function judgementLines(curve: CurveResult): readonly JudgementLine[] {
  const { tests } = curve;
  return [
    ...backCalculation(curve),
    ...residuals(curve),
    ...ofTest('lackOfFit', tests.lackOfFit),
    ...ofTest('mandel', tests.mandel),
    ...intercept(curve),
    ...interceptSize(curve),
    range(curve),
    ...ofTest('homogeneity', tests.homogeneity),
    ...ofTest('cochran', tests.cochran),
    ...ofTest('levene', tests.levene),
    ...outliersAmongReplicates(curve),
    ...weighting(curve),
    ...learnedVariance(curve),
  ];
}

/** The tests that could not be made, each with its reason. */
export function unmadeTests({ tests }: CurveResult): readonly UnmadeTest[] {
  return TEST_ORDER.flatMap((key) => {
    const reason = tests[key]?.reason;
    return reason === undefined ? [] : [{ name: TEST_NAMES[key], reason }];
  });
}
