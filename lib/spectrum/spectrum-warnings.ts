import { LIMITS } from '@/lib/limits';
import { roundTo } from '@/lib/format/round';
import type { ReaderWarning } from '@/lib/readers/types';
import type { ReadingForm } from './reading-form';

/** Highest absorbance of a spectrum; null when it has no number. */
export function highestAbsorbance(form: ReadingForm): number | null {
  return form.absorbance.reduce<number | null>(
    (highest, value) => (value !== null && (highest === null || value > highest) ? value : highest),
    null,
  );
}

function aboveLimit(form: ReadingForm): ReaderWarning[] {
  const above = form.wavelengthNm.filter((_, i) => (form.absorbance[i] ?? -Infinity) > LIMITS.absorbance);
  const [first, last] = [above[0], above.at(-1)];
  if (first === undefined || last === undefined) return [];
  const [from, to] = [roundTo(first, 1), roundTo(last, 1)];
  const where = from === to ? `at ${from} nm` : `between ${from} and ${to} nm`;
  return [
    {
      code: 'ABOVE_ABSORBANCE_LIMIT',
      message: `Above ${LIMITS.absorbance} ${where}: under ${100 * 10 ** -LIMITS.absorbance} % of the light gets through. Dilute before you quantify there`,
      value: highestAbsorbance(form) ?? undefined,
    },
  ];
}

function repeated({ repeatedWavelengths: count }: ReadingForm): ReaderWarning[] {
  if (count === 0) return [];
  const what = count === 1 ? '1 wavelength stands' : `${count} wavelengths stand`;
  return [
    {
      code: 'REPEATED_WAVELENGTH',
      message: `${what} more than once in the file; plots and readings use the mean there`,
      value: count,
    },
  ];
}

/** What a person should know before reading a number off this spectrum, beside what the reader said. */
export function spectrumWarnings(form: ReadingForm, isAbsorbance: boolean): ReaderWarning[] {
  return [...(isAbsorbance ? aboveLimit(form) : []), ...repeated(form)];
}
