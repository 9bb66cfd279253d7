import Link from 'next/link';
import { Facts } from '@/components/ui/facts';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import { significantText } from '@/lib/format/round';
import type { BatchHead } from '@/lib/views/batch';

/** What the samples of a batch are read on and how. */
export function BatchFacts({ batch, base }: { batch: BatchHead; base: string }) {
  const { method, curve } = batch;
  const unit = unitWithBasis(method.unit, method.basis);
  return (
    <Facts
      label="How the samples are read"
      facts={[
        {
          label: 'Standard curve',
          value: (
            <Link
              href={`${base}/curves/${curve.id}`}
              className="font-sans text-base underline decoration-rule-strong underline-offset-2 hover:text-uv"
            >
              {curve.title}
            </Link>
          ),
          note: `version ${curve.version}`,
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
        {
          label: 'Standards from, to',
          value: (
            <>
              {significantText(method.range.min, 4)} – {significantText(method.range.max, 4)}{' '}
              <small>{method.unit}</small>
            </>
          ),
          note: 'in the measured solution',
        },
        {
          label: 'Path length of the curve',
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
