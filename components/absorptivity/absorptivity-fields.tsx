'use client';

import { ReadingRuleForm } from '@/components/spectrum/reading-rule-form';
import { Disclosure } from '@/components/ui/disclosure';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextArea } from '@/components/ui/text-area';
import { ABSORPTIVITY_WORDS } from '@/lib/absorptivity/absorptivity-words';
import type { AbsorptivityTexts } from '@/lib/absorptivity/form-start';
import { CONCENTRATION_UNIT_NAMES } from '@/lib/engine';
import type { FailedForm } from '@/lib/form-state';
import { LIMITS } from '@/lib/limits';
import { ABSORPTIVITY_KINDS } from '@/lib/schemas/absorptivity';
import { spectrumRule } from '@/lib/schemas/spectrum-rule';

const PAIR = 'grid grid-cols-1 items-start gap-3 sm:grid-cols-2';
const KINDS = ABSORPTIVITY_KINDS.map((value) => ({ value, label: ABSORPTIVITY_WORDS[value].name }));
const UNITS = CONCENTRATION_UNIT_NAMES.map((value) => ({ value, label: value }));
const SIGNALS = [
  { value: 'absorbance', label: 'absorbance' },
  { value: 'transmittance', label: 'transmittance, 0 to 1' },
  { value: 'percentTransmittance', label: 'transmittance, per cent' },
];
const CONFIDENCES = ['0.9', '0.95', '0.99'].map((value) => ({
  value,
  label: `${100 * Number(value)} %`,
}));

export interface AbsorptivityFieldsProps {
  texts: AbsorptivityTexts;
  onTexts: (texts: AbsorptivityTexts) => void;
  failed?: FailedForm;
}

/** Name, value and change of one text; a refused form brings its sentence. */
function bound(
  { texts, onTexts, failed }: AbsorptivityFieldsProps,
  name: Exclude<keyof AbsorptivityTexts, 'rule'>,
) {
  return {
    name,
    failed,
    value: texts[name],
    onChange: (event: { currentTarget: { value: string } }) =>
      onTexts({ ...texts, [name]: event.currentTarget.value }),
  };
}

/** What is measured, and in which unit. */
export function AnalyteFields(props: AbsorptivityFieldsProps) {
  return (
    <div className={PAIR}>
      <Field
        label="Analyte"
        placeholder="Iron(II) as ferroin"
        maxLength={LIMITS.name}
        {...bound(props, 'analyte')}
      />
      <Field
        label="Title"
        optional
        placeholder="Analyte and wavelength"
        maxLength={LIMITS.title}
        {...bound(props, 'title')}
      />
      <Select label="Concentration unit" options={UNITS} {...bound(props, 'unit')} />
      <Field
        label="Counted as"
        optional
        placeholder="Fe"
        hint="The basis of the concentration: Fe, N, P"
        {...bound(props, 'basis')}
      />
      <Field
        label="Formula mass of the basis"
        unit="g/mol"
        inputMode="decimal"
        optional
        hint="Needed between a molar absorptivity and a mass unit, or the other way round"
        {...bound(props, 'formulaMass')}
      />
    </div>
  );
}

/** The value, where it comes from, and what it holds for. */
export function ValueFields(props: AbsorptivityFieldsProps) {
  const kind = ABSORPTIVITY_KINDS.find((name) => name === props.texts.kind) ?? 'molar';
  const { symbol, unit } = ABSORPTIVITY_WORDS[kind];
  return (
    <div className="grid gap-3">
      <Select label="Kind of absorptivity" options={KINDS} {...bound(props, 'kind')} />
      <div className={PAIR}>
        <Field
          label={`Absorptivity, ${symbol}`}
          inputMode="decimal"
          hint={`In ${unit}`}
          {...bound(props, 'value')}
        />
        <Field
          label="Its standard uncertainty u"
          inputMode="decimal"
          optional
          hint={`In ${unit}; left empty, results say that u is too small`}
          {...bound(props, 'u')}
        />
      </div>
      <TextArea
        label="Source"
        rows={2}
        maxLength={LIMITS.purpose}
        hint="Where the value comes from: book and page, certificate, official method, own work"
        {...bound(props, 'source')}
      />
      <TextArea
        label="Conditions"
        optional
        rows={2}
        maxLength={LIMITS.purpose}
        hint="Solvent, pH, temperature, bandwidth it holds for"
        {...bound(props, 'conditions')}
      />
    </div>
  );
}

/** Where spectra are read; typed readings are taken at the same place. */
export function PlaceFields({ texts, onTexts, failed }: AbsorptivityFieldsProps) {
  const parsed = spectrumRule.safeParse(texts);
  const names = ['at', 'half', 'from', 'to', 'minus'] as const;
  const errors = Object.fromEntries(
    names.flatMap((name) => {
      const sentence = failed?.fields[name]?.[0];
      return sentence === undefined ? [] : [[name, sentence]];
    }),
  );
  return (
    <ReadingRuleForm
      state={{ texts, rule: parsed.data ?? null, errors, untouched: false }}
      onChange={(rule) => onTexts({ ...texts, ...rule })}
    />
  );
}

/** The cell, the readings, and how results are given. */
export function ReadingFields(props: AbsorptivityFieldsProps) {
  return (
    <div className="grid gap-3">
      <div className={PAIR}>
        <Field label="Path length" unit="mm" inputMode="decimal" {...bound(props, 'pathLengthMm')} />
        <Field
          label="u of the path length"
          unit="mm"
          inputMode="decimal"
          optional
          hint="It does not cancel here: there are no standards in the same cell"
          {...bound(props, 'pathLengthUMm')}
        />
        <Select label="Readings are typed in" options={SIGNALS} {...bound(props, 'signal')} />
        <Field
          label="Scatter of one reading, A"
          inputMode="decimal"
          optional
          hint="Standard deviation known beforehand; with it a critical value can be said"
          {...bound(props, 'readingSd')}
        />
      </div>
      <Disclosure summary="Level of confidence and absorbance limit">
        <div className={PAIR}>
          <Select label="Level of confidence" options={CONFIDENCES} {...bound(props, 'confidence')} />
          <Field
            label="Absorbance limit"
            inputMode="decimal"
            hint="As read; above it no number is trusted"
            {...bound(props, 'absorbanceLimit')}
          />
        </div>
      </Disclosure>
    </div>
  );
}

/** The hazard note, and why a new version is made. */
export function AbsorptivityNotes({
  isNewVersion,
  ...props
}: AbsorptivityFieldsProps & { isNewVersion: boolean }) {
  return (
    <div className="grid gap-3">
      <TextArea
        label="Hazard note"
        optional
        rows={2}
        hint="Shown wherever work with it is done"
        {...bound(props, 'hazardNote')}
      />
      {isNewVersion && (
        <Field
          label="What is different in this version"
          optional
          maxLength={LIMITS.reason}
          {...bound(props, 'reason')}
        />
      )}
    </div>
  );
}
