import { EngineError, type EngineErrorCode } from '../errors';

/*
 * Refusals shared by the checks of a request: each names what was needed, what came, and where in the request.
 */

export function requireFinite(value: number | undefined, what: string, pointer: string): void {
  if (value !== undefined && !Number.isFinite(value)) {
    throw new EngineError('NOT_FINITE', `${what} must be a finite number, got ${value}`, pointer);
  }
}

export function requirePositive(
  value: number | undefined,
  code: EngineErrorCode,
  what: string,
  pointer: string,
): void {
  requireFinite(value, what, pointer);
  if (value !== undefined && value <= 0) {
    throw new EngineError(code, `${what} must be above zero, got ${value}`, pointer);
  }
}

export function requireNotNegative(value: number | undefined, what: string, pointer: string): void {
  requireFinite(value, what, pointer);
  if (value !== undefined && value < 0) {
    throw new EngineError('UNCERTAINTY_NEGATIVE', `${what} must not be below zero, got ${value}`, pointer);
  }
}

export function requireReadings(readings: readonly unknown[], what: string, pointer: string): void {
  if (readings.length === 0) {
    throw new EngineError('NO_READINGS', `${what} needs at least one reading, got none`, pointer);
  }
}

export function requireChoice(
  value: string,
  choices: readonly string[],
  what: string,
  pointer: string,
): void {
  if (!choices.includes(value)) {
    throw new EngineError(
      'UNKNOWN_CHOICE',
      `${what} must be one of ${choices.join(', ')}, got ${value}`,
      pointer,
    );
  }
}
