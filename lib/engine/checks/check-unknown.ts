import { EngineError } from '../errors';
import type {
  AnyDilutionStep,
  DilutionStep,
  MassDilutionStep,
  UnknownRequest,
  ValueWithU,
  Ware,
} from '../types';
import { isMassStep } from '../unknown/dilution-factor';
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
  requirePositive(
    unknown.wingEstimate,
    'ESTIMATE_NOT_POSITIVE',
    'the estimate from the wing',
    `${pointer}/wingEstimate`,
  );
  checkDilution(unknown.dilution ?? [], `${pointer}/dilution`);
  checkRecovery(unknown.recovery, `${pointer}/recovery`);
}

export function checkDilution(steps: readonly AnyDilutionStep[], pointer: string): void {
  steps.forEach((step, i) => {
    if (isMassStep(step)) checkMassStep(step, `${pointer}/${i}`);
    else checkStep(step, `${pointer}/${i}`);
  });
}

function checkStep(step: DilutionStep, pointer: string): void {
  requirePositive(step.takenMl, 'VOLUME_NOT_POSITIVE', 'the volume taken (mL)', `${pointer}/takenMl`);
  requirePositive(step.toMl, 'VOLUME_NOT_POSITIVE', 'the volume made up to (mL)', `${pointer}/toMl`);
  requireGrowth(step.takenMl, step.toMl, 'mL', `${pointer}/toMl`);
  checkVolume(step.takenUMl, step.takenWare, `${pointer}/taken`);
  checkVolume(step.toUMl, step.toWare, `${pointer}/to`);
}

function requireGrowth(taken: number, to: number, unit: string, pointer: string): void {
  if (to >= taken) return;
  throw new EngineError(
    'DILUTION_BELOW_TAKEN',
    `a dilution must be made up to at least what was taken: ${taken} ${unit} taken, made up to ${to} ${unit}`,
    pointer,
  );
}

function checkMassStep(step: MassDilutionStep, pointer: string): void {
  requirePositive(step.takenG, 'MASS_NOT_POSITIVE', 'the mass taken (g)', `${pointer}/takenG`);
  requirePositive(step.toG, 'MASS_NOT_POSITIVE', 'the mass made up to (g)', `${pointer}/toG`);
  requireGrowth(step.takenG, step.toG, 'g', `${pointer}/toG`);
  requireNotNegative(step.takenUG, 'the uncertainty of a mass (g)', `${pointer}/takenUG`);
  requireNotNegative(step.toUG, 'the uncertainty of a mass (g)', `${pointer}/toUG`);
  for (const [member, value] of Object.entries(step.densities ?? {})) {
    const at = `${pointer}/densities/${member}`;
    if (member.includes('UG')) requireNotNegative(value, 'the uncertainty of a density (g/mL)', at);
    else requirePositive(value, 'MASS_NOT_POSITIVE', 'a density (g/mL)', at);
  }
}

export function checkRecovery(recovery: ValueWithU | undefined, pointer: string): void {
  if (!recovery) return;
  requirePositive(recovery.value, 'RECOVERY_NOT_POSITIVE', 'the recovery', `${pointer}/value`);
  requireNotNegative(recovery.u, 'the uncertainty of the recovery', `${pointer}/u`);
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
