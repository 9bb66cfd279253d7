import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import type { RuleKind, RuleTexts } from '@/lib/schemas/spectrum-rule';

import type { RuleState } from './use-spectra-view';

const KINDS: readonly { value: RuleKind; label: string }[] = [
  { value: 'interpolated', label: 'at a wavelength, interpolated' },
  { value: 'point', label: 'at the nearest point' },
  { value: 'bandMean', label: 'mean of a band' },
  { value: 'windowMaximum', label: 'maximum in a window' },
];

/** How a number is read off each spectrum. Follows every key; what does not fit gets its sentence at its field. */
export function ReadingRuleForm({
  state: { texts, errors },
  onChange,
}: {
  state: RuleState;
  onChange: (texts: RuleTexts) => void;
}) {
  const nanometres = (name: Exclude<keyof RuleTexts, 'rule'>, label: string, optional = false) => (
    <Field
      name={name}
      label={label}
      unit="nm"
      inputMode="decimal"
      optional={optional}
      value={texts[name]}
      error={errors[name]}
      onChange={(event) => onChange({ ...texts, [name]: event.currentTarget.value })}
    />
  );
  return (
    <div className="grid gap-3 p-4" role="group" aria-label="How it is read">
      <Select
        name="rule"
        label="Read"
        options={KINDS}
        value={texts.rule}
        onChange={(event) => onChange({ ...texts, rule: event.currentTarget.value as RuleKind })}
      />
      <div className="grid grid-cols-2 items-start gap-3">
        {texts.rule === 'windowMaximum' ? (
          <>
            {nanometres('from', 'From')}
            {nanometres('to', 'To')}
          </>
        ) : (
          <>
            {nanometres('at', texts.rule === 'bandMean' ? 'Middle' : 'Wavelength')}
            {texts.rule === 'bandMean' && nanometres('half', 'Half-width')}
          </>
        )}
      </div>
      {nanometres('minus', 'Minus the reading at', true)}
    </div>
  );
}
