import type { FittedCurve } from '../fit-curve';
import { NORMAL_PATH_MM } from '../prepare-points';
import type { BudgetLine, UnknownRequest } from '../types';
import { type Component, coverageFactor, effectiveDegreesOfFreedom } from '../uncertainty/expand';
import type { ConvertedReadings } from './convert-readings';
import type { DilutionFactor } from './dilution-factor';
import type { ReadBack } from './read-back';

/** A line of the budget with what the working needs to derive it. */
export interface BudgetTerm {
  readonly source: string;
  readonly kind: 'curve' | 'readings' | 'blank' | 'standards' | 'volume' | 'path';
  /** Of the concentration in the sample. */
  readonly u: number;
  readonly sharesS: boolean;
  readonly degreesOfFreedom: number;
  /** Relative uncertainty behind it, for the lines that are one. */
  readonly relative?: number;
  /** Which volume or path it is. */
  readonly of?: string;
}

export interface Expanded {
  readonly terms: readonly BudgetTerm[];
  readonly lines: readonly BudgetLine[];
  readonly value: number;
  readonly u: number;
  readonly degreesOfFreedom: number;
  readonly k: number;
  readonly U: number;
}

/**
 * The budget of a concentration in the sample, C = c·F: u_c² = Σ (c_i u_i)². The lines that rest on the curve's
 * one estimate s (curve, readings, a common blank) count as one component with ν = n - q in ν_eff.
 *
 * @source JCGM 100:2008 (GUM), 5.1 and G.4; EURACHEM/CITAC Guide CG 4
 */
export function makeBudget(
  curve: FittedCurve,
  unknown: UnknownRequest,
  readings: ConvertedReadings,
  back: ReadBack,
  factor: DilutionFactor,
): Expanded {
  const value = back.c * factor.value;
  const terms = [
    ...ofTheCurve(curve, readings, back, factor.value),
    ...ofTheStandards(curve, value),
    ...factor.volumes
      .filter((term) => term.uMl > 0)
      .map((term) => typeB('volume', term.label, value, term.uMl / term.volumeMl, term.id)),
    ...ofThePaths(curve, unknown, readings, back, factor.value),
  ];
  const u = Math.hypot(...terms.map((term) => term.u));
  const degreesOfFreedom = effectiveDegreesOfFreedom(components(terms), curve.fit.degreesOfFreedom);
  const k = coverageFactor(curve.request.confidence, degreesOfFreedom);
  const lines = terms.map((term): BudgetLine => ({
    source: term.source,
    u: term.u,
    share: u === 0 ? 0 : (term.u / u) ** 2,
    ...(term.sharesS ? { sharesS: true as const } : {}),
  }));
  return { terms, lines, value, u, degreesOfFreedom, k, U: k * u };
}

function components(terms: readonly BudgetTerm[]): readonly Component[] {
  const sharing = terms.filter((term) => term.sharesS);
  const nu = sharing[0]?.degreesOfFreedom ?? Infinity;
  return [
    { u: Math.hypot(0, ...sharing.map((term) => term.u)), degreesOfFreedom: nu },
    ...terms.filter((term) => !term.sharesS),
  ];
}

function typeB(
  kind: BudgetTerm['kind'],
  source: string,
  scale: number,
  relative: number,
  of?: string,
): BudgetTerm {
  return {
    kind,
    source,
    u: Math.abs(scale) * relative,
    sharesS: false,
    degreesOfFreedom: Infinity,
    relative,
    ...(of === undefined ? {} : { of }),
  };
}

function ofTheCurve(
  curve: FittedCurve,
  readings: ConvertedReadings,
  back: ReadBack,
  factor: number,
): readonly BudgetTerm[] {
  const nu = curve.fit.degreesOfFreedom;
  const own = back.replicates.own;
  const uBlank = commonBlankU(curve, readings, back);
  const blank: BudgetTerm = {
    kind: 'blank',
    source: 'blank',
    u: uBlank * factor,
    sharesS: true,
    degreesOfFreedom: nu,
  };
  return [
    { kind: 'curve', source: 'curve', u: back.uCurve * factor, sharesS: true, degreesOfFreedom: nu },
    {
      kind: 'readings',
      source: 'readings',
      u: back.uReadings * factor,
      // The unknown's own standard deviation is another estimate, with degrees of freedom of its own.
      sharesS: !own,
      degreesOfFreedom: own ? readings.y.length - 1 : nu,
    },
    ...(uBlank > 0 ? [blank] : []),
  ];
}

/**
 * The error of a subtracted mean blank, u² = s²/p_b, which all readings of its path have in common. With a free
 * intercept it cancels in c. Through zero it does not: it moves y0 and, through every standard, the slope, so that
 *
 *     ∂c/∂δ = (c Σ w x / Σ w x² - 1) / b        (one path)
 */
export function commonBlankU(curve: FittedCurve, readings: ConvertedReadings, back: ReadBack): number {
  const { fit, blanks, data, active } = curve;
  const [, slope = NaN] = fit.beta;
  if (fit.model !== 'proportional' || blanks.use !== 'subtract') return 0;
  const squares = data.x.reduce((sum, x, i) => sum + (data.w[i] ?? 0) * x * x, 0);
  const paths = new Set(blanks.readings.map((blank) => blank.pathLengthMm));
  const parts = [...paths].map((pathLengthMm) => {
    const lever = active.reduce(
      (sum, point, i) =>
        point.pathLengthMm === pathLengthMm ? sum + (data.w[i] ?? 0) * (data.x[i] ?? 0) : sum,
      0,
    );
    const direct = readings.pathLengthMm === pathLengthMm ? 1 : 0;
    const perMm = NORMAL_PATH_MM / pathLengthMm;
    const sensitivity = ((back.c * lever) / squares - direct) * (perMm / slope);
    // s²/(p_b w): the blank is a reading at the absorbance zero, in its own path.
    const weight = curve.weightAt(0, 0, pathLengthMm) * perMm ** 2;
    const uMean = fit.residualSd / Math.sqrt(blanks.countAt(pathLengthMm) * weight);
    return sensitivity * uMean;
  });
  return Math.hypot(0, ...parts);
}

/** What all standards share (stock, purity, common ware), counted once. */
function ofTheStandards(curve: FittedCurve, value: number): readonly BudgetTerm[] {
  const relative = curve.request.standardsRelativeU ?? 0;
  return relative > 0 ? [typeB('standards', 'standards', value, relative)] : [];
}

/**
 * Path lengths: one cell for standards and unknown cancels in c. In different cells u(l)/l of each is a line, and
 * what it scales is the whole absorbance: y0/f'(c), which is c for a curve through zero.
 */
function ofThePaths(
  curve: FittedCurve,
  unknown: UnknownRequest,
  readings: ConvertedReadings,
  back: ReadBack,
  factor: number,
): readonly BudgetTerm[] {
  if (!isOtherCell(curve, unknown)) return [];
  const scale = ((readings.meanY ?? 0) / back.slope) * factor;
  const own = (unknown.pathLengthUMm ?? 0) / readings.pathLengthMm;
  const standards = (curve.request.pathLengthUMm ?? 0) / curve.request.pathLengthMm;
  return [
    ...(own > 0 ? [typeB('path', 'path length of the unknown', scale, own, 'unknown')] : []),
    ...(standards > 0 ? [typeB('path', 'path length of the standards', scale, standards, 'standards')] : []),
  ];
}

/** Another path length than the standards', or an uncertainty of its own: another cell. */
export function isOtherCell(curve: FittedCurve, unknown: UnknownRequest): boolean {
  const path = unknown.pathLengthMm ?? curve.request.pathLengthMm;
  return unknown.pathLengthUMm !== undefined || path !== curve.request.pathLengthMm;
}
