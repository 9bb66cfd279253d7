import { Facts, type Fact } from '@/components/ui/facts';
import type { CurveResult } from '@/lib/engine';
import { formatNumber } from '@/lib/format/number';
import { ShortQuantity } from './short-quantity';

const LINE_LABEL = {
  linear: 'Line, A per 10 mm',
  proportional: 'Line through zero, A per 10 mm',
  quadratic: 'Quadratic, A per 10 mm',
} as const;

function lineFact({ model, slope, intercept, quadratic }: CurveResult): Fact {
  const below = intercept.value < 0;
  return {
    label: LINE_LABEL[model],
    value: (
      <span className="inline-flex flex-wrap gap-x-2">
        <span className="whitespace-nowrap">
          <ShortQuantity {...slope} inSum /> c
        </span>
        {quadratic && (
          <span className="whitespace-nowrap">
            {quadratic.value < 0 ? '\u2212' : '+'}{' '}
            <ShortQuantity value={Math.abs(quadratic.value)} u={quadratic.u} inSum /> c<sup>2</sup>
          </span>
        )}
        {model !== 'proportional' && (
          <span className="whitespace-nowrap">
            {below ? '\u2212' : '+'} <ShortQuantity value={Math.abs(intercept.value)} u={intercept.u} inSum />
          </span>
        )}
      </span>
    ),
  };
}

function epsilonFact({ molarAbsorptivity: epsilon }: CurveResult): Fact {
  if (!epsilon)
    return {
      label: 'Molar absorptivity ε',
      value: <small>not claimed</small>,
      note: 'needs a formula mass and a known path',
    };
  return {
    label: 'Molar absorptivity ε',
    value: (
      <>
        <ShortQuantity value={epsilon.value} u={epsilon.u} />{' '}
        <small className="whitespace-nowrap">
          L mol<sup>{'\u2212'}1</sup> cm<sup>{'\u2212'}1</sup>
        </small>
      </>
    ),
  };
}

const residualFact = ({ residualSd, degreesOfFreedom }: CurveResult): Fact => ({
  label: 'Residual SD, A',
  value: formatNumber(residualSd, 2),
  note: `${degreesOfFreedom} degrees of freedom`,
});

const rangeFact = ({ range, unit, n }: CurveResult): Fact => ({
  label: 'Standards',
  value: (
    <>
      {formatRange(range.min)} to {formatRange(range.max)} <small>{unit}</small>
    </>
  ),
  note: `${n} ${n === 1 ? 'reading' : 'readings'} in the fit`,
});

const criticalFact = ({ criticalValue, criticalValueReadings: k, unit }: CurveResult): Fact => ({
  label: 'Critical value',
  value: (
    <>
      {formatNumber(criticalValue, 2)} <small>{unit}</small>
    </>
  ),
  note: `below it, ${k === 1 ? 'one reading' : `the mean of ${k}`} is not told from a blank`,
});

const formatRange = (value: number) => String(Number(value.toPrecision(6)));

/** The strip of figures of a curve. */
export function CurveFacts({ curve }: { curve: CurveResult }) {
  const facts = [
    lineFact(curve),
    epsilonFact(curve),
    residualFact(curve),
    rangeFact(curve),
    criticalFact(curve),
  ];
  return <Facts label="The line and its figures" facts={facts} />;
}
