import { FlagList } from '@/components/flags/flag-list';
import { Card } from '@/components/ui/card';
import { ToneShape } from '@/components/ui/pill';
import type { CurveResult, TestAnswer } from '@/lib/engine';

const TEST_NAMES: Readonly<Record<keyof CurveResult['tests'], string>> = {
  lackOfFit: 'Lack of fit',
  mandel: 'Curvature (Mandel)',
  intercept: 'Intercept against zero',
  homogeneity: 'Equal variances',
  cochran: 'No level wider than the others (Cochran)',
  levene: 'Levels alike (Levene)',
};

function Test({ name, test }: { name: string; test: TestAnswer }) {
  if (test.reason !== undefined) return null;
  return (
    <li className="flex gap-2">
      <ToneShape tone={test.passed ? 'order' : 'decide'} className="mt-1.5" />
      <span className="min-w-0">
        {name}: {test.verdict}
      </span>
    </li>
  );
}

/** What speaks for and against a curve, in sentences; r² small and last, for it says the least. */
export function CurveJudgements({ curve }: { curve: CurveResult }) {
  const tests = Object.entries(curve.tests) as [keyof CurveResult['tests'], TestAnswer][];
  const made = tests.filter(([, test]) => test.reason === undefined);
  return (
    <Card title="What it is worth">
      <div className="grid gap-3">
        <FlagList flags={curve.flags} inOrder="Nothing speaks against this curve." />
        {made.length > 0 && (
          <ul className="grid gap-2 border-t pt-3">
            {made.map(([key, test]) => (
              <Test key={key} name={TEST_NAMES[key]} test={test} />
            ))}
          </ul>
        )}
        {curve.molarAbsorptivity && (
          <p className="border-t pt-3 text-sm text-ink-2">ε: {curve.molarAbsorptivity.covers}</p>
        )}
        <p className="text-xs text-ink-2">
          r<sup>2</sup> = <span className="num">{curve.rSquared.toFixed(5)}</span>, which says little about a
          calibration: look at the residuals.
        </p>
      </div>
    </Card>
  );
}
