import { FlagList } from '@/components/flags/flag-list';
import { Card } from '@/components/ui/card';
import { Disclosure } from '@/components/ui/disclosure';
import { ToneShape } from '@/components/ui/pill';
import { judgementLines, unmadeTests, type UnmadeTest } from '@/lib/curve/judgement-lines';
import type { CurveResult } from '@/lib/engine';

function Unmade({ tests }: { tests: readonly UnmadeTest[] }) {
  if (tests.length === 0) return null;
  return (
    <Disclosure
      summary={tests.length === 1 ? 'One test was not made' : `${tests.length} tests were not made`}
    >
      <ul className="grid gap-1.5 text-sm text-ink-2">
        {tests.map(({ name, reason }) => (
          <li key={name}>
            <span className="text-ink">{name}:</span> {reason}
          </li>
        ))}
      </ul>
    </Disclosure>
  );
}

/** What speaks for and against a curve, in sentences and in the order that matters; r² small and last, for it says the least. */
export function CurveJudgements({ curve }: { curve: CurveResult }) {
  return (
    <Card title="What it is worth">
      <div className="grid gap-3">
        <FlagList flags={curve.flags} inOrder="Nothing speaks against this curve." />
        <ul className="grid gap-2 border-t pt-3">
          {judgementLines(curve).map(({ key, name, tone, sentence }) => (
            <li key={key} className="flex gap-2">
              <ToneShape tone={tone} className="mt-1.5" />
              <span className="min-w-0">
                <span className="font-medium">{name}.</span> {sentence}
              </span>
            </li>
          ))}
        </ul>
        <Unmade tests={unmadeTests(curve)} />
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
