export * from './types';
export { absorbanceOf, transmittanceOf, type Absorbance, type CensorReason } from './absorbance';
export { compareModels } from './comparison/compare-models';
export { effectOfLeavingOut } from './comparison/leave-out';
export { curveBand, type BandPoint } from './curve-band';
export { ENGINE_ERRORS, EngineError, type EngineErrorCode } from './errors';
export { FLAGS, type Flag, type FlagCode, type FlagLevel } from './flags';
export {
  readSpectrum,
  type ReadingRule,
  type SpectrumPoints,
  type SpectrumReading,
} from './spectrum/read-spectrum';
export { calculateStandardCurve } from './standard-curve';
export {
  CONCENTRATION_UNIT_NAMES,
  CONCENTRATION_UNITS,
  convertConcentration,
  isMolar,
  parseUnit,
  type ConcentrationUnit,
} from './units';
export { volumeUncertainty } from './uncertainty/volume';
export { ENGINE_VERSION } from './version';
export {
  learnVarianceFunction,
  type LearnedVarianceFunction,
  type LevelScatter,
} from './weighting/learn-variance-function';
export { type WorkingStep } from './working/ledger';
