export * from './types';
export { absorbanceOf, transmittanceOf, type Absorbance, type CensorReason } from './absorbance';
export { compareModels } from './comparison/compare-models';
export { effectOfLeavingOut } from './comparison/leave-out';
export { curveBand, type BandPoint } from './curve-band';
export {
  prepareSeries,
  type PreparedSeries,
  type PreparedStandard,
  type SeriesRequest,
  type SeriesSolution,
  STOCK,
} from './dilution/series';
export { type Stock, type StockRequest, stockSolution } from './dilution/stock';
export { WARE, type WareItem, type WareKind, wareLibrary, wareOf } from './dilution/ware';
export { resultFromBracketing } from './direct/bracketing';
export { resultFromKnownAbsorptivity } from './direct/known-absorptivity';
export { resultFromSingleStandard } from './direct/single-standard';
export type {
  AbsorptivityKind,
  BracketingRequest,
  DirectAnswer,
  DirectRequest,
  DirectResult,
  KnownAbsorptivityRequest,
  SingleStandardRequest,
} from './direct/types';
export { ENGINE_ERRORS, EngineError, type EngineErrorCode } from './errors';
export { FLAGS, type Flag, type FlagCode, type FlagLevel } from './flags';
export { allLimits, type LimitNotMade, type LimitsAnswer, type LimitsRequest } from './limits/all-limits';
export { type MdlStudy, type StudySample } from './limits/mdl';
export { MONTE_CARLO_TRIALS, monteCarlo } from './monte-carlo/monte-carlo';
export { type Propagation, propagate } from './monte-carlo/propagate';
export { type Simulated } from './monte-carlo/simulate';
export { type MonteCarloAnswer, type MonteCarloOptions } from './monte-carlo/simulate-result';
export { peakSeenThroughSlit, slopeLoss } from './photometry/bandwidth';
export { LEAST_PHOTOMETRIC_ERROR_AT, photometricErrorPercent } from './photometry/photometric-error';
export {
  strayAbsorbance,
  strayBias,
  strayCeiling,
  strayPlateau,
  type StrayBias,
  type StrayCeiling,
} from './photometry/stray-light';
export {
  readSpectrum,
  type ReadingRule,
  type SpectrumPoints,
  type SpectrumReading,
} from './spectrum/read-spectrum';
export { estimateFromWing, type WingEstimate, type WingRequest } from './spectrum/wing-estimate';
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
