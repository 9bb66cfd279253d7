import { absorbanceText, nmRangeText, nmText } from '@/lib/format/optical';
import type { SignalKind } from '@/lib/readers/types';
import type { SpectrumDetail } from '@/lib/views/spectrum';

const SIGNALS: Record<SignalKind, string> = {
  absorbance: 'absorbance',
  transmittance: 'transmittance, as a fraction; A = \u2212log\u2081\u2080 T',
  percentTransmittance: 'transmittance in per cent; A = 2 \u2212 log\u2081\u2080 %T',
  other: 'neither absorbance nor transmittance; shown as it stands',
};

/** What a spectrum is, in words; a guess of the reader is called one. */
export function spectrumFacts(spectrum: SpectrumDetail): { label: string; value: string }[] {
  const { signalText, highestAbsorbance, pathLengthMm, gapCount, signalScale } = spectrum;
  const guessed = (text: string, guess: boolean) =>
    guess ? `${text} (assumed: the file does not say)` : text;
  const word = signalText === '' ? '' : `, \u201c${signalText}\u201d in the file`;
  const scale = signalScale === 1 ? '' : `, times ${signalScale}`;
  return [
    { label: 'Range', value: nmRangeText(spectrum.fromNm, spectrum.toNm) },
    {
      label: 'Points',
      value: gapCount > 0 ? `${spectrum.pointCount}, ${gapCount} of them gaps` : `${spectrum.pointCount}`,
    },
    { label: 'Wavelength axis', value: guessed(spectrum.xUnit, spectrum.xUnitGuessed) },
    { label: 'Ordinate', value: guessed(SIGNALS[spectrum.signal] + word + scale, spectrum.signalGuessed) },
    {
      label: 'Highest absorbance',
      value: highestAbsorbance === null ? 'none' : absorbanceText(highestAbsorbance),
    },
    {
      label: 'Path length',
      value: pathLengthMm === null ? 'not stated in the file' : `${nmText(pathLengthMm)} mm, from the file`,
    },
  ];
}
