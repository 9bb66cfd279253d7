'use client';

import { useEffect, useMemo } from 'react';
import { SpectraChart } from '@/components/charts/spectra-chart';
import { drawnSpectra } from '@/components/spectrum/drawn-spectra';
import { ReadingRuleForm } from '@/components/spectrum/reading-rule-form';
import { ReadingsTable } from '@/components/spectrum/readings-table';
import type { RuleState } from '@/components/spectrum/use-spectra-view';
import { useSpectrumPoints } from '@/components/spectrum/use-spectrum-points';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import type { ReadingRule } from '@/lib/engine';
import { nmText } from '@/lib/format/optical';
import type { RuleTexts } from '@/lib/schemas/spectrum-rule';
import { readPointsByRule } from '@/lib/spectrum/read-points-by-rule';
import { ruleInWords } from '@/lib/spectrum/rule-in-words';
import { suggestWavelength } from '@/lib/spectrum/suggest-wavelength';
import type { SpectrumUse, SpectrumView } from '@/lib/views/spectrum';

/** The place that the plot marks. */
function markOf(rule: ReadingRule | null) {
  if (rule?.fromNm !== undefined && rule.toNm !== undefined)
    return { atNm: (rule.fromNm + rule.toNm) / 2, halfWidthNm: (rule.toNm - rule.fromNm) / 2 };
  return rule?.wavelengthNm === undefined
    ? undefined
    : { atNm: rule.wavelengthNm, halfWidthNm: rule.halfWidthNm ?? 0 };
}

const atWavelength = (texts: RuleTexts, nm: number): RuleTexts => ({
  ...texts,
  rule: texts.rule === 'windowMaximum' ? 'interpolated' : texts.rule,
  at: nmText(nm),
});

/** A drawn band becomes the window of a maximum when one is read, else the band of a mean. */
function overBand(texts: RuleTexts, from: number, to: number): RuleTexts {
  if (texts.rule === 'windowMaximum') return { ...texts, from: nmText(from), to: nmText(to) };
  return { ...texts, rule: 'bandMean', at: nmText((from + to) / 2), half: nmText((to - from) / 2) };
}

/** The chosen spectra over each other, and beside them what is read off each. */
export function PlotAndReadings({
  chosen,
  uses,
  state,
  onRule,
}: {
  chosen: readonly SpectrumView[];
  uses: Readonly<Record<string, SpectrumUse>>;
  state: RuleState;
  onRule: (texts: RuleTexts) => void;
}) {
  const { data = [], error, mutate } = useSpectrumPoints(chosen.map((spectrum) => spectrum.id));
  const drawn = useMemo(() => drawnSpectra(chosen, data, uses), [chosen, data, uses]);
  const suggested = data.length === chosen.length ? suggestWavelength(data) : null;
  const { rule } = state;
  useEffect(() => {
    // the address names the wavelength as soon as it is known, so that a link shows the same view for ever
    if (state.untouched && suggested !== null) onRule({ ...state.texts, at: nmText(suggested) });
  });
  const readings = rule
    ? chosen.flatMap((spectrum) => {
        const view = data.find((points) => points.id === spectrum.id);
        const { name, pathLengthMm } = spectrum;
        return view ? [{ ...readPointsByRule(view, rule, pathLengthMm), name }] : [];
      })
    : [];
  const loading = chosen.length > 0 && drawn.length === 0 && !error;

  return (
    <Columns share="wideFirst">
      <Card title="Absorbance" aside="as read: no blank taken off · click to read there, drag to read a band">
        {error ? (
          <Notice
            tone="stop"
            title="The points could not be fetched"
            action={<Button onClick={() => void mutate()}>Try again</Button>}
          >
            Nothing is lost; the connection to the notebook may have been.
          </Notice>
        ) : loading ? (
          <Skeleton rows={8} label="Fetching the points" />
        ) : drawn.length === 0 ? (
          <p className="py-12 text-center text-ink-2">Choose spectra in the list below to see them here.</p>
        ) : (
          <SpectraChart
            spectra={drawn}
            chosen={markOf(rule)}
            onPickWavelength={(nm) => onRule(atWavelength(state.texts, nm))}
            onPickBand={(from, to) => onRule(overBand(state.texts, from, to))}
          />
        )}
      </Card>
      <Card flush title={rule ? ruleInWords(rule) : 'Readings'}>
        <ReadingRuleForm state={state} onChange={onRule} />
        {readings.length > 0 && (
          <div className="border-t">
            <ReadingsTable
              readings={readings}
              drawn={drawn}
              showsPlace={rule?.kind === 'windowMaximum' || rule?.kind === 'point'}
              hasMinus={rule?.minusNm !== undefined}
            />
          </div>
        )}
      </Card>
    </Columns>
  );
}
