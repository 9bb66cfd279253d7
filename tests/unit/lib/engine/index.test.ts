import { expect, test } from 'vitest';
import * as engine from '@/lib/engine';

// A list our own code must keep: what the rest of the project may use of the engine.
test('the engine exports these values and no others', () => {
  expect(Object.keys(engine).sort()).toEqual([
    'CONCENTRATION_UNITS',
    'CONCENTRATION_UNIT_NAMES',
    'ENGINE_ERRORS',
    'ENGINE_VERSION',
    'EngineError',
    'FLAGS',
    'LEAST_PHOTOMETRIC_ERROR_AT',
    'MONTE_CARLO_TRIALS',
    'absorbanceOf',
    'allLimits',
    'calculateStandardCurve',
    'compareModels',
    'convertConcentration',
    'curveBand',
    'effectOfLeavingOut',
    'isMolar',
    'learnVarianceFunction',
    'monteCarlo',
    'parseUnit',
    'peakSeenThroughSlit',
    'photometricErrorPercent',
    'propagate',
    'readSpectrum',
    'resultFromBracketing',
    'resultFromKnownAbsorptivity',
    'resultFromSingleStandard',
    'slopeLoss',
    'strayAbsorbance',
    'strayBias',
    'strayCeiling',
    'strayPlateau',
    'transmittanceOf',
    'volumeUncertainty',
  ]);
});
