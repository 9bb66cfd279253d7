import { averageSpectra } from './average';
import { straightBaseline, threePointBaseline } from './baselines';
import { CorrectionError } from './errors';
import { interpolate } from './interpolate';
import { offsetAt, offsetByWindow } from './offset';
import { normalisePath } from './path-normalise';
import type { CorrectedSpectrum, OtherSpectrum, RecipeContext } from './recipe';
import type { RecipeStep } from './recipe-types';
import { subtractSampleBlank } from './sample-blank';
import { derivative, smooth } from './savitzky-golay';
import { scatterCorrection } from './scatter';
import { subtractSpectrum } from './subtract-spectrum';
import type { CorrectionWarning, StepOutcome } from './types';
import { say, warnIf } from './words';

type State = Pick<CorrectedSpectrum, 'points' | 'pathLengthMm' | 'smoothed'>;

/** One step of a recipe, on the points as the steps before left them. */
export function runStep(state: State, step: RecipeStep, context: RecipeContext): StepOutcome {
  const { points } = state;
  switch (step.kind) {
    case 'subtractSpectrum': {
      const other = named(context, step.spectrumId);
      return warnedOfPath(subtractSpectrum(points, other), state, other);
    }
    case 'sampleBlank': {
      const { sampleDilution, blankDilution, ratioRelativeU } = step;
      const other = named(context, step.spectrumId);
      const blank = { ...other, sampleDilution, blankDilution, ratioRelativeU: ratioRelativeU ?? 0 };
      return warnedOfPath(subtractSampleBlank(points, blank), state, other);
    }
    case 'offsetAt':
      return offsetAt(points, step.wavelengthNm);
    case 'offsetByWindow':
      return offsetByWindow(points, step.fromNm, step.toNm);
    case 'straightBaseline':
      return straightBaseline(points, step.lowNm, step.highNm);
    case 'threePointBaseline':
      return threePointBaseline(points, step.lowNm, step.middleNm, step.highNm);
    case 'scatter':
      return scatterCorrection(points, step.fromNm, step.toNm);
    case 'smooth':
      return smooth(points, step);
    case 'derivative':
      return derivative(points, step, step.order);
    case 'average':
      return averageSpectra([points, ...step.spectrumIds.map((id) => named(context, id).points)]);
    case 'interpolate':
      return interpolate(points, step.fromNm, step.toNm, step.stepNm);
    case 'normalisePath':
      return normalisePath(points, pathOf(step.pathLengthMm, state), step.uMm);
  }
}

function named({ spectra }: RecipeContext, id: string): OtherSpectrum {
  const found = Object.hasOwn(spectra, id) ? spectra[id] : undefined;
  if (found) return found;
  throw new CorrectionError('SPECTRUM_UNKNOWN', `the spectrum ${id} that this step names is not here`);
}

function pathOf(given: number | null, { pathLengthMm }: State): number {
  const path = given ?? pathLengthMm;
  if (path !== null) return path;
  throw new CorrectionError(
    'PATH_MISSING',
    'no path length is known for this spectrum; state it in the step, in millimetres',
  );
}

function warnedOfPath(outcome: StepOutcome, { pathLengthMm }: State, other: OtherSpectrum): StepOutcome {
  const path = other.pathLengthMm ?? null;
  const differs: readonly CorrectionWarning[] =
    path === null || pathLengthMm === null
      ? []
      : warnIf(
          path !== pathLengthMm,
          'BLANK_PATH',
          `“${other.name}” was measured in ${say(path)} mm and the sample stands at ${say(pathLengthMm)} mm: what it takes off is not what the sample holds. Use a blank of the same path length.`,
        );
  return { ...outcome, warnings: [...outcome.warnings, ...differs] };
}
