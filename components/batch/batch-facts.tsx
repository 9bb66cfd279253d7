import Link from 'next/link';
import { Facts, type Fact } from '@/components/ui/facts';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import { ABSORPTIVITY_WORDS } from '@/lib/absorptivity/absorptivity-words';
import { readOn, readOnHref } from '@/lib/batch/read-on';
import { formatShort } from '@/lib/format/quantity';
import { significantText } from '@/lib/format/round';
import type { BatchHead, BatchMethodView } from '@/lib/views/batch';

/** What the results lie between, or the absorptivity they rest on when no standards were measured. */
function footingFact({ range, unit, knownAbsorptivity }: BatchMethodView): Fact[] {
  if (range)
    return [
      {
        label: 'Standards from, to',
        value: (
          <>
            {significantText(range.min, 4)} – {significantText(range.max, 4)} <small>{unit}</small>
          </>
        ),
        note: 'in the measured solution',
      },
    ];
  if (!knownAbsorptivity) return [];
  const { kind, value, u, source } = knownAbsorptivity;
  const words = ABSORPTIVITY_WORDS[kind];
  return [
    {
      label: words.symbol,
      value: (
        <>
          {formatShort(value, u ?? 0).text} <small>{words.unit}</small>
        </>
      ),
      note: u === null ? `${source}; u not stated` : source,
    },
  ];
}

/** What the samples of a batch are read on and how. */
export function BatchFacts({ batch, base }: { batch: BatchHead; base: string }) {
  const { method } = batch;
  const on = readOn(batch);
  const onCurve = on.kind === 'curve';
  const unit = unitWithBasis(method.unit, method.basis);
  return (
    <Facts
      label="How the samples are read"
      facts={[
        {
          label: onCurve ? 'Standard curve' : 'Known absorptivity',
          value: (
            <Link
              href={readOnHref(on, base)}
              className="font-sans text-base underline decoration-rule-strong underline-offset-2 hover:text-uv"
            >
              {on.title}
            </Link>
          ),
          note: `version ${on.version}`,
        },
        {
          label: 'Analyte',
          value: <span className="font-sans text-base">{method.analyte}</span>,
          note: `in ${unit}`,
        },
        {
          label: 'Read at',
          value: (
            <>
              {significantText(method.wavelengthNm, 6)} <small>nm</small>
            </>
          ),
          note: readingRuleWords(method.readingRule),
        },
        ...footingFact(method),
        {
          label: onCurve ? 'Path length of the curve' : 'Path length',
          value: (
            <>
              {significantText(method.pathLengthMm, 5)} <small>mm</small>
            </>
          ),
          note: `absorbance limit ${significantText(method.absorbanceLimit, 3)} as read`,
        },
      ]}
    />
  );
}
