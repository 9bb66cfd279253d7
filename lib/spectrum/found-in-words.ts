import type { SignalKind } from '@/lib/readers/types';
import type { SourceFileView } from '@/lib/views/source-file';

const SIGNALS: Record<SignalKind, string> = {
  absorbance: 'absorbance',
  transmittance: 'transmittance, converted',
  percentTransmittance: 'per cent transmittance, converted',
  other: 'not absorbance',
};

const count = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

/** What a file holds: "6 spectra · 301 points each · absorbance, nm". */
export function foundInWords(file: SourceFileView): string {
  const { spectrumCount, pointCount, signals, xUnits } = file;
  const each = pointCount / spectrumCount;
  const points =
    spectrumCount > 1 && Number.isInteger(each)
      ? `${count(each, 'point', 'points')} each`
      : count(pointCount, 'point', 'points');
  const axes = [...signals.map((signal) => SIGNALS[signal]), ...xUnits].join(', ');
  return [count(spectrumCount, 'spectrum', 'spectra'), points, axes].join(' \u00b7 ');
}
