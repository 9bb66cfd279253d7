import { EngineError, type EngineErrorCode } from '@/lib/engine/errors';
import { checkSpectrum } from '@/lib/engine/spectrum/read-spectrum';
import { CorrectionError, type CorrectionErrorCode } from './errors';
import { NORMAL_PATH_MM } from './path-normalise';
import { type Recipe, RECIPE_VERSION, type RecipeStep, type StepKind } from './recipe-types';
import { runStep } from './run-step';
import type { CorrectionWarning, Found, Points } from './types';

/** Another spectrum that a step may name. */
export interface OtherSpectrum {
  readonly name: string;
  readonly points: Points;
  readonly pathLengthMm?: number | null;
}

/** What a recipe is followed with: everything besides the points, so that the same context replays the same way. */
export interface RecipeContext {
  readonly spectra: Readonly<Record<string, OtherSpectrum>>;
  /** Of the sample; null when nobody has said. */
  readonly pathLengthMm: number | null;
}

export interface StepDone {
  readonly kind: StepKind;
  readonly name: string;
  readonly did: string;
  readonly warnings: readonly CorrectionWarning[];
  readonly found: readonly Found[];
}

export interface CorrectedSpectrum {
  readonly points: Points;
  readonly steps: readonly StepDone[];
  /** Of all steps, in their order. */
  readonly warnings: readonly CorrectionWarning[];
  /** To be marked on plot and export, and not used for quantitation unless the method says so. */
  readonly smoothed: boolean;
  /** 0 while the ordinate is absorbance; else it is absorbance per nm to this power. */
  readonly derivativeOrder: number;
  readonly pathLengthMm: number | null;
}

/** A step that cannot be made, told with its place in the recipe. */
export class RecipeError extends Error {
  override readonly name = 'RecipeError';

  constructor(
    readonly code: CorrectionErrorCode | EngineErrorCode,
    message: string,
    readonly pointer: string,
  ) {
    super(message);
  }
}

/** These need an absorbance; after a derivative there is none. */
const AFTER_DERIVATIVE: readonly StepKind[] = ['interpolate', 'normalisePath'];

/**
 * Follow a recipe from the first step to the last. The points and the context are not changed, and the same three
 * give the same answer: nothing here knows the time or a random number. `until` stops after so many steps, for
 * before and after.
 *
 * @throws RecipeError with the pointer of the step; RECIPE_VERSION for a version that is not known
 */
export function applyRecipe(
  points: Points,
  recipe: Recipe,
  context: RecipeContext,
  until = recipe.steps.length,
): CorrectedSpectrum {
  if (recipe.version !== RECIPE_VERSION) {
    throw new RecipeError(
      'RECIPE_VERSION',
      `this recipe is of version ${recipe.version}; version ${RECIPE_VERSION} is known`,
      '/version',
    );
  }
  checkSpectrum(points);
  return recipe.steps
    .slice(0, until)
    .reduce((state, step, i) => told(step, i, () => advance(state, step, context)), startOf(points, context));
}

function startOf(points: Points, { pathLengthMm }: RecipeContext): CorrectedSpectrum {
  const copy: Points = {
    wavelengthNm: [...points.wavelengthNm],
    absorbance: [...points.absorbance],
    ...(points.u === undefined ? {} : { u: [...points.u] }),
  };
  return { points: copy, steps: [], warnings: [], smoothed: false, derivativeOrder: 0, pathLengthMm };
}

function advance(state: CorrectedSpectrum, step: RecipeStep, context: RecipeContext): CorrectedSpectrum {
  refuseOrder(state, step);
  const { points, did, warnings, found = [] } = runStep(state, step, context);
  return {
    points,
    steps: [...state.steps, { kind: step.kind, name: step.name, did, warnings, found }],
    warnings: [...state.warnings, ...warnings],
    smoothed: state.smoothed || step.kind === 'smooth',
    derivativeOrder: step.kind === 'derivative' ? step.order : state.derivativeOrder,
    pathLengthMm: step.kind === 'normalisePath' ? NORMAL_PATH_MM : state.pathLengthMm,
  };
}

function refuseOrder(state: CorrectedSpectrum, { kind }: RecipeStep): void {
  if (state.derivativeOrder > 0 && !AFTER_DERIVATIVE.includes(kind)) {
    throw new CorrectionError(
      'AFTER_DERIVATIVE',
      'the ordinate is a derivative by now; put this step before it (a higher derivative is one step of its own)',
    );
  }
  if (kind === 'average' && state.steps.length > 0) {
    throw new CorrectionError(
      'AVERAGE_NOT_FIRST',
      'the other replicates have not been through the steps before; average first, then correct the mean',
    );
  }
  if (kind === 'normalisePath' && state.steps.some((done) => done.kind === kind)) {
    throw new CorrectionError('TAKEN_OFF_TWICE', 'this spectrum was brought to 10 mm by an earlier step');
  }
}

function told<T>(step: RecipeStep, i: number, work: () => T): T {
  try {
    return work();
  } catch (error) {
    // every refusal names its step; anything else is a bug and passes as it is
    if (!(error instanceof CorrectionError || error instanceof EngineError)) throw error;
    throw new RecipeError(error.code, `Step ${i + 1}, “${step.name}”: ${error.message}`, `/steps/${i}`);
  }
}
