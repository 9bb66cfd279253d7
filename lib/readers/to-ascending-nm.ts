import type { GapReason, ReadSpectrum, ReaderWarning, XUnit } from './types';

/** A spectrum ready for plots and computing: nm, absorbance, ascending; gaps are NaN with their reason. */
export interface AscendingSpectrum {
  readonly wavelengthNm: Float64Array;
  readonly absorbance: Float64Array;
  /** Place in `wavelengthNm` → why there is no number. */
  readonly gapReasons: Readonly<Record<number, GapReason>>;
  readonly warnings: readonly ReaderWarning[];
}

/** hc/e in eV·nm (CODATA 2018, exact by the definitions of h, c and e). */
const EV_NM = 1239.8419843320026;

const TO_NM: Record<XUnit, (x: number) => number> = {
  nm: (x) => x,
  '1/cm': (x) => 1e7 / x,
  um: (x) => x * 1000,
  angstrom: (x) => x / 10,
  eV: (x) => EV_NM / x,
};

/** Wavelength in nm of an x value given in a file's unit: λ = x, 10⁷/ν̃, 1000·x, x/10 or hc/E. */
export function toNm(x: number, unit: XUnit): number {
  return TO_NM[unit](x);
}

/**
 * Bring a spectrum to nm and absorbance, ascending.
 *
 *     A = −log₁₀ T        A = 2 − log₁₀ %T        T ≤ 0 is a gap `aboveRange`, never infinity
 *
 * The raw points stay as they are in the argument. Equal wavelengths stay next to each other in file order.
 * A signal that is neither absorbance nor transmittance passes unchanged with a warning.
 */
export function toAscendingNm(spectrum: ReadSpectrum): AscendingSpectrum {
  const n = spectrum.x.length;
  const nm = Float64Array.from(spectrum.x, TO_NM[spectrum.xUnit]);
  const order = ascendingOrder(nm);
  const reasons = new Map<number, GapReason>();
  for (const gap of spectrum.gaps) reasons.set(gap.index, gap.reason);

  const wavelengthNm = new Float64Array(n);
  const absorbance = new Float64Array(n);
  const gapReasons: Record<number, GapReason> = {};
  let opaque = 0;
  for (let i = 0; i < n; i++) {
    const from = order[i] ?? 0;
    wavelengthNm[i] = nm[from] ?? NaN;
    const raw = (spectrum.y[from] ?? NaN) * spectrum.signalScale;
    const dark = isTransmittance(spectrum) && raw <= 0;
    if (dark) opaque += 1;
    const value = dark ? NaN : toAbsorbance(raw, spectrum);
    absorbance[i] = value;
    if (Number.isNaN(value)) gapReasons[i] = dark ? 'aboveRange' : (reasons.get(from) ?? 'missing');
  }
  return { wavelengthNm, absorbance, gapReasons, warnings: conversionWarnings(spectrum, opaque) };
}

function isTransmittance(spectrum: ReadSpectrum): boolean {
  return spectrum.signal === 'transmittance' || spectrum.signal === 'percentTransmittance';
}

function toAbsorbance(raw: number, spectrum: ReadSpectrum): number {
  if (spectrum.signal === 'transmittance') return -Math.log10(raw);
  if (spectrum.signal === 'percentTransmittance') return 2 - Math.log10(raw);
  return raw;
}

function ascendingOrder(nm: Float64Array): Uint32Array {
  const order = Uint32Array.from(nm, (_, i) => i);
  let rising = true;
  let falling = true;
  for (let i = 1; i < nm.length; i++) {
    const step = (nm[i] ?? 0) - (nm[i - 1] ?? 0);
    if (!(step >= 0)) rising = false;
    if (!(step < 0)) falling = false;
  }
  if (rising) return order;
  if (falling) return order.reverse();
  return order.sort((a, b) => (nm[a] ?? 0) - (nm[b] ?? 0) || a - b);
}

function conversionWarnings(spectrum: ReadSpectrum, opaque: number): ReaderWarning[] {
  const warnings: ReaderWarning[] = [];
  if (opaque > 0) {
    const message = `${opaque} ${opaque === 1 ? 'point has' : 'points have'} a transmittance of zero or less: no light came through, so they are gaps above range`;
    warnings.push({ code: 'TRANSMITTANCE_NOT_POSITIVE', message, value: opaque });
  }
  if (spectrum.signal === 'other') {
    const unit = spectrum.signalText || 'not stated';
    warnings.push({
      code: 'NOT_ABSORBANCE',
      message: `The ordinate (${unit}) is not absorbance and is shown as it stands`,
    });
  }
  return warnings;
}
