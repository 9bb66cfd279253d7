'use client';

import { Checkbox } from '@/components/ui/checkbox';
import { Disclosure } from '@/components/ui/disclosure';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextArea } from '@/components/ui/text-area';
import type { AboutTexts } from '@/lib/curve/form-start';
import type { CalculationTexts } from '@/lib/curve/live-curve';
import { CONCENTRATION_UNIT_NAMES, isMolar, parseUnit } from '@/lib/engine/units';
import { LIMITS } from '@/lib/limits';
import { boundText, type Issues } from './form-text';

const UNITS = CONCENTRATION_UNIT_NAMES.map((unit) => ({
  value: unit,
  label: unit === 'mmol/L' ? 'mmol/L (mM)' : unit,
}));
const SIGNALS = [
  { value: 'absorbance', label: 'absorbance' },
  { value: 'transmittance', label: 'transmittance, 0 to 1' },
  { value: 'percentTransmittance', label: 'transmittance, per cent' },
];
const MODELS = [
  { value: 'linear', label: 'straight line with an intercept' },
  { value: 'proportional', label: 'straight line through zero' },
  { value: 'quadratic', label: 'quadratic: six levels or more' },
];
const WEIGHTINGS = [
  { value: 'none', label: 'none: even scatter' },
  { value: '1/x', label: '1/x: grows with √c' },
  { value: '1/x2', label: '1/x²: grows with c' },
  { value: '1/y', label: '1/y: grows with √A of the fit' },
  { value: '1/y2', label: '1/y²: grows with A of the fit' },
  { value: 'varianceFunction', label: 'variance function: s² = s0² + (kA)²' },
  { value: 'replicates', label: 'replicates: four or more at every level' },
];
const BLANK_RULES = [
  { value: 'none', label: 'none: zeroed in the instrument' },
  { value: 'subtract', label: 'subtract the mean blank' },
  { value: 'level', label: 'a level at concentration zero' },
];
const CONFIDENCES = [
  { value: '0.9', label: '90 %' },
  { value: '0.95', label: '95 %' },
  { value: '0.99', label: '99 %' },
];

const PAIR = 'grid grid-cols-1 items-start gap-3 sm:grid-cols-2';

interface AboutProps {
  about: AboutTexts;
  onAbout: (about: AboutTexts) => void;
  calculation: CalculationTexts;
  onCalculation: (calculation: CalculationTexts) => void;
  issues: Issues;
}

/** What is measured, in which unit, and in which cell. */
export function AboutFields({ about, onAbout, calculation, onCalculation, issues }: AboutProps) {
  const word = (key: keyof AboutTexts) => boundText('about', about, onAbout, issues, key);
  const number = (key: keyof CalculationTexts) =>
    boundText('calculation', calculation, onCalculation, issues, key);
  const unit = parseUnit(calculation.unit);
  const molar = unit !== null && isMolar(unit);
  return (
    <div className="grid gap-3">
      <div className={PAIR}>
        <Field
          label="Analyte"
          placeholder="Iron(II) as ferroin"
          maxLength={LIMITS.name}
          {...word('analyte')}
        />
        <Field
          label="Title"
          optional
          placeholder="Analyte and wavelength"
          maxLength={LIMITS.title}
          {...word('title')}
        />
        <Select label="Concentration unit" options={UNITS} {...number('unit')} />
        <Field
          label="Counted as"
          optional
          placeholder="Fe"
          hint="The basis of the concentration: Fe, N, P"
          {...word('basis')}
        />
        <Field
          label="Formula mass of the basis"
          unit="g/mol"
          inputMode="decimal"
          optional={!molar}
          hint="ε is claimed only with it"
          {...number('formulaMass')}
        />
        <Field label="Path length" unit="mm" inputMode="decimal" {...number('pathLengthMm')} />
      </div>
      <Checkbox
        name="calculation.pathLengthKnown"
        label="The path length is known, not assumed"
        checked={calculation.pathLengthKnown}
        onChange={(event) => onCalculation({ ...calculation, pathLengthKnown: event.currentTarget.checked })}
      />
    </div>
  );
}

interface FitProps {
  calculation: CalculationTexts;
  onCalculation: (calculation: CalculationTexts) => void;
  issues: Issues;
}

/** How the readings are used: blank, model, weights, limits. */
export function FitFields({ calculation, onCalculation, issues }: FitProps) {
  const number = (key: keyof CalculationTexts) =>
    boundText('calculation', calculation, onCalculation, issues, key);
  return (
    <div className="grid gap-3">
      <div className={PAIR}>
        <Select label="Blank" options={BLANK_RULES} {...number('blankRule')} />
        <Select label="Line" options={MODELS} {...number('model')} />
        <Select label="Weights" options={WEIGHTINGS} {...number('weighting')} />
        <Field
          label="Absorbance limit"
          inputMode="decimal"
          hint="As read; above it no number is trusted"
          {...number('absorbanceLimit')}
        />
      </div>
      {calculation.weighting === 'varianceFunction' && (
        <div className={PAIR}>
          <Field
            label="Constant part s0"
            inputMode="decimal"
            hint="Standard deviation of one reading near zero, A per 10 mm"
            {...number('varianceS0')}
          />
          <Field
            label="Proportional part k"
            inputMode="decimal"
            hint="What is added for each unit of absorbance"
            {...number('varianceK')}
          />
        </div>
      )}
      <Disclosure summary="Uncertainty of what all standards share, and of the path">
        <div className={PAIR}>
          <Field
            label="Shared by all standards"
            unit="% u"
            inputMode="decimal"
            optional
            hint="Relative standard uncertainty of stock, purity, common ware"
            {...number('standardsRelativeUPercent')}
          />
          <Field
            label="u of the path length"
            unit="mm"
            inputMode="decimal"
            optional
            hint="Standard uncertainty; enters ε"
            {...number('pathLengthUMm')}
          />
          <Select label="Level of confidence" options={CONFIDENCES} {...number('confidence')} />
        </div>
      </Disclosure>
    </div>
  );
}

/** What the readings are; asked for typed ones only. */
export function SignalField({ calculation, onCalculation, issues }: FitProps) {
  return (
    <Select
      label="The readings are"
      options={SIGNALS}
      {...boundText('calculation', calculation, onCalculation, issues, 'signal')}
    />
  );
}

/** The hazard note, and why a new version is made. */
export function NoteFields({
  about,
  onAbout,
  issues,
  isNewVersion,
}: Pick<AboutProps, 'about' | 'onAbout' | 'issues'> & { isNewVersion: boolean }) {
  const word = (key: keyof AboutTexts) => boundText('about', about, onAbout, issues, key);
  return (
    <div className="grid gap-3">
      <TextArea
        label="Hazard note"
        optional
        rows={2}
        placeholder="Perchloric acid: fume hood, no organics"
        hint="Shown wherever work with this method is done"
        {...word('hazardNote')}
      />
      {isNewVersion && (
        <Field
          label="What is different in this version"
          optional
          maxLength={LIMITS.reason}
          placeholder="S4 prepared again"
          {...word('reason')}
        />
      )}
    </div>
  );
}
