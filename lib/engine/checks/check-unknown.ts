import { EngineError } from '../errors';
import type { DilutionStep, UnknownRequest, Ware } from '../types';
import { requireNotNegative, requirePositive, requireReadings } from './require';

export function checkUnknown(unknown: UnknownRequest, pointer: string): void {
  requireReadings(unknown.readings, 'an unknown', `${pointer}/readings`);
  requirePositive(
    unknown.pathLengthMm,
    'PATH_LENGTH_NOT_POSITIVE',
    'the path length (mm)',
    `${pointer}/pathLengthMm`,
  );
  requireNotNegative(
    unknown.pathLengthUMm,
    'the uncertainty of the path length (mm)',
    `${pointer}/pathLengthUMm`,
  );
  requirePositive(unknown.weight, 'WEIGHT_NOT_POSITIVE', 'a weight', `${pointer}/weight`);
  (unknown.dilution ?? []).forEach((step, i) => checkStep(step, `${pointer}/dilution/${i}`));
}

function checkStep(step: DilutionStep, pointer: string): void {
  requirePositive(step.takenMl, 'VOLUME_NOT_POSITIVE', 'the volume taken (mL)', `${pointer}/takenMl`);
  requirePositive(step.toMl, 'VOLUME_NOT_POSITIVE', 'the volume made up to (mL)', `${pointer}/toMl`);
  if (step.toMl < step.takenMl) {
    throw new EngineError(
      'DILUTION_BELOW_TAKEN',
      `a dilution must be made up to at least what was taken: ${step.takenMl} mL taken, made up to ${step.toMl} mL`,
      `${pointer}/toMl`,
    );
  }
  checkVolume(step.takenUMl, step.takenWare, `${pointer}/taken`);
  checkVolume(step.toUMl, step.toWare, `${pointer}/to`);
}

function checkVolume(uMl: number | undefined, ware: Ware | undefined, pointer: string): void {
  requireNotNegative(uMl, 'the uncertainty of a volume (mL)', `${pointer}UMl`);
  if (!ware) return;
  if (uMl !== undefined) {
    throw new EngineError(
      'VOLUME_U_TWICE',
      'give the uncertainty of a volume as a number or by its ware, not both',
      `${pointer}Ware`,
    );
  }
  requireNotNegative(ware.toleranceMl, 'a tolerance (mL)', `${pointer}Ware/toleranceMl`);
  requireNotNegative(ware.repeatabilityMl, 'a repeatability (mL)', `${pointer}Ware/repeatabilityMl`);
  requireNotNegative(ware.temperatureRangeK, 'a temperature range (K)', `${pointer}Ware/temperatureRangeK`);
}
