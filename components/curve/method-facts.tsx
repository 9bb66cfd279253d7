import type { ReactNode } from 'react';
import { Card } from '@/components/ui/card';
import { unitWithBasis } from '@/lib/batch/unit-text';
import { WEIGHTING_WORDS } from '@/lib/curve/model-words';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import type { StoredMethod } from '@/lib/curve/stored-curve';
import type { CurveView } from '@/lib/views/curve';

const SIGNAL = {
  absorbance: 'absorbance',
  transmittance: 'transmittance',
  percentTransmittance: 'per cent transmittance',
} as const;
const BLANK = {
  none: 'none, zeroed in the instrument',
  level: 'every blank reading is a level at zero',
  subtract: 'the mean blank is subtracted',
} as const;
const MODEL = {
  linear: 'straight line',
  proportional: 'straight line through zero',
  quadratic: 'quadratic',
} as const;

function pathWords({ pathLengthMm, pathLengthKnown, pathLengthUMm }: StoredMethod): string {
  const u = pathLengthUMm === null ? '' : `, u = ${pathLengthUMm} mm`;
  return `${pathLengthMm} mm${u}${pathLengthKnown ? '' : ' (assumed)'}`;
}

function readWords({ standards, method }: CurveView): string {
  const typed = standards.every(({ readings }) => readings.every(({ origin }) => origin === 'typed'));
  return typed
    ? `typed, ${SIGNAL[method.signal]} at ${method.wavelengthNm} nm`
    : readingRuleWords(method.readingRule);
}

function weightWords({ weighting, varianceFunction }: StoredMethod): string {
  if (!varianceFunction) return WEIGHTING_WORDS[weighting];
  return `s² = ${varianceFunction.s0}² + (${varianceFunction.k} A)²`;
}

/** The method behind a curve, as it stood when this version was saved. */
export function MethodFacts({ curve }: { curve: CurveView }) {
  const { method } = curve;
  const facts: readonly (readonly [string, ReactNode])[] = [
    ['Analyte', method.analyte],
    ['Concentration', unitWithBasis(method.unit, method.basis)],
    ['Formula mass', method.formulaMass === null ? 'not given' : `${method.formulaMass} g/mol`],
    ['Reading', readWords(curve)],
    ['Path length', pathWords(method)],
    ['Blank', BLANK[method.blankRule]],
    ['Line', MODEL[method.model]],
    ['Weights', weightWords(method)],
    ['Absorbance limit', String(method.absorbanceLimit)],
    ['Level of confidence', `${Number((100 * method.confidence).toPrecision(3))} %`],
    ...(method.standardsRelativeU === null
      ? []
      : [
          [
            'Shared by all standards',
            `u = ${Number((100 * method.standardsRelativeU).toPrecision(4))} %`,
          ] as const,
        ]),
    ['Calculated by', `engine ${curve.engineVersion}`],
  ];
  return (
    <Card title="Method" aside={`version ${method.version}`}>
      <dl className="grid grid-cols-1 gap-x-6 gap-y-2 sm:grid-cols-2">
        {facts.map(([label, value]) => (
          <div key={label}>
            <dt className="text-xs text-ink-2">{label}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
    </Card>
  );
}
