import { HazardNotice, WithoutStandardsNotice } from '@/components/batch/batch-notices';
import { CurveStatusNotice } from '@/components/curve/curve-status';
import { ShortQuantity } from '@/components/curve/short-quantity';
import { VersionTable } from '@/components/curve/version-table';
import { FlagList } from '@/components/flags/flag-list';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { Facts } from '@/components/ui/facts';
import { ABSORPTIVITY_WORDS } from '@/lib/absorptivity/absorptivity-words';
import { exampleSentence } from '@/lib/absorptivity/example-reading';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import { significantText } from '@/lib/format/round';
import type { AbsorptivityView } from '@/lib/views/absorptivity';

const SIGNAL = {
  absorbance: 'absorbance',
  transmittance: 'transmittance',
  percentTransmittance: 'per cent transmittance',
} as const;

function Figures({ of }: { of: AbsorptivityView }) {
  const words = ABSORPTIVITY_WORDS[of.kind];
  const stated = (u: number | null, unit: string) => (u === null ? 'u not stated' : `u = ${u} ${unit}`);
  return (
    <Facts
      label="The absorptivity and what it is used with"
      facts={[
        {
          label: words.symbol,
          value: (
            <>
              <ShortQuantity value={of.value} u={of.u ?? 0} /> <small>{words.unit}</small>
            </>
          ),
          note: stated(of.u, words.unit),
        },
        {
          label: 'Read at',
          value: (
            <>
              {significantText(of.wavelengthNm, 6)} <small>nm</small>
            </>
          ),
          note: readingRuleWords(of.readingRule),
        },
        {
          label: 'Results in',
          value: <span className="font-sans text-base">{unitWithBasis(of.unit, of.basis)}</span>,
          note: of.formulaMass === null ? undefined : `formula mass ${of.formulaMass} g/mol`,
        },
        {
          label: 'Path length',
          value: (
            <>
              {significantText(of.pathLengthMm, 5)} <small>mm</small>
            </>
          ),
          note: stated(of.pathLengthUMm, 'mm'),
        },
      ]}
    />
  );
}

function Origin({ of }: { of: AbsorptivityView }) {
  const facts: readonly (readonly [string, string])[] = [
    ['Source', of.source],
    ['Conditions', of.conditions || 'not stated'],
    ['Analyte', of.analyte],
    ['Readings are typed in', SIGNAL[of.signal]],
    [
      'Scatter of one reading',
      of.readingSd === null ? 'not stated' : `A ${of.readingSd}, standard deviation`,
    ],
    ['Absorbance limit', String(of.absorbanceLimit)],
    ['Level of confidence', `${significantText(100 * of.confidence, 3)} %`],
  ];
  return (
    <Card title="Where it comes from" aside={`version ${of.version}`}>
      <dl className="grid grid-cols-1 gap-x-6 gap-y-2 sm:grid-cols-2">
        {facts.map(([label, value]) => (
          <div key={label}>
            <dt className="text-xs text-ink-2">{label}</dt>
            <dd className="whitespace-pre-line">{value}</dd>
          </div>
        ))}
      </dl>
    </Card>
  );
}

/** Everything of a known absorptivity under its title. */
export function AbsorptivityDetail({ of, timeZone }: { of: AbsorptivityView; timeZone: string }) {
  return (
    <div className="grid gap-4.5">
      <CurveStatusNotice curve={of} folder="absorptivities" />
      <HazardNotice note={of.hazardNote} />
      <Figures of={of} />
      <Columns>
        <Origin of={of} />
        <div className="grid min-w-0 gap-4.5">
          <Card title="What a reading means">
            <p className="font-serif text-fact">{exampleSentence(of)}</p>
          </Card>
          <Card title="What to know about it">
            <FlagList flags={of.flags} inOrder="Its uncertainty and its conditions are stated." />
          </Card>
        </div>
      </Columns>
      <WithoutStandardsNotice />
      <VersionTable
        label="Versions of this absorptivity"
        versions={of.versions}
        shownId={of.id}
        base={`/notebooks/${of.notebookId}/absorptivities`}
        timeZone={timeZone}
      />
    </div>
  );
}
