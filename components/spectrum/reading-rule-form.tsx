import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { nmText } from '@/lib/format/optical';
import { parseDecimal } from '@/lib/schemas/decimal';
import type { RuleKind, RuleTexts } from '@/lib/schemas/spectrum-rule';

import type { RuleState } from './use-spectra-view';

const KINDS: readonly { value: RuleKind; label: string }[] = [
  { value: 'interpolated', label: 'at a wavelength, interpolated' },
  { value: 'point', label: 'at the nearest point' },
  { value: 'bandMean', label: 'mean of a band' },
  { value: 'windowMaximum', label: 'maximum in a window' },
];

const USUAL_HALF_WIDTH_NM = 1;
const USUAL_HALF_WINDOW_NM = 25;

/** Another kind begins about the wavelength that was read so far, so that there is a reading at once. */
function ofKind(texts: RuleTexts, rule: RuleKind): RuleTexts {
  const at = parseDecimal(texts.at);
  const around = (offset: number) => (at.ok ? nmText(Math.max(1, at.value + offset)) : '');
  const [from, to] = [parseDecimal(texts.from), parseDecimal(texts.to)];
  const middle = from.ok && to.ok ? nmText((from.value + to.value) / 2) : '';
  return {
    ...texts,
    rule,
    at: texts.at || middle,
    half: texts.half || String(USUAL_HALF_WIDTH_NM),
    from: texts.from || around(-USUAL_HALF_WINDOW_NM),
    to: texts.to || around(USUAL_HALF_WINDOW_NM),
  };
}

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
        onChange={(event) => onChange(ofKind(texts, event.currentTarget.value as RuleKind))}
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
