import { EngineError } from './errors';

/*
 * Concentration units. Each is a factor to a coherent one: g/L for the mass units, mol/L for the molar ones.
 * The micro sign is U+00B5 in everything we print; U+03BC (Greek mu), which keyboards and spreadsheets also
 * give, is accepted.
 */

export const CONCENTRATION_UNITS = {
  'mg/L': { isMolar: false, perLitre: 1e-3, name: 'milligrams per litre' },
  '\u00b5g/mL': { isMolar: false, perLitre: 1e-3, name: 'micrograms per millilitre' },
  'g/L': { isMolar: false, perLitre: 1, name: 'grams per litre' },
  'mol/L': { isMolar: true, perLitre: 1, name: 'moles per litre' },
  'mmol/L': { isMolar: true, perLitre: 1e-3, name: 'millimoles per litre' },
  '\u00b5mol/L': { isMolar: true, perLitre: 1e-6, name: 'micromoles per litre' },
} as const;

export type ConcentrationUnit = keyof typeof CONCENTRATION_UNITS;

export const CONCENTRATION_UNIT_NAMES = Object.keys(CONCENTRATION_UNITS) as readonly ConcentrationUnit[];

/** The unit as we write it, from text with either micro sign; null when it is none of ours. */
export function parseUnit(text: string): ConcentrationUnit | null {
  const written = text.trim().replaceAll('\u03bc', '\u00b5');
  return Object.hasOwn(CONCENTRATION_UNITS, written) ? (written as ConcentrationUnit) : null;
}

export function isMolar(unit: ConcentrationUnit): boolean {
  return CONCENTRATION_UNITS[unit].isMolar;
}

/**
 * A concentration in another unit: c' = c × f / f', and across mass and amount c(mol/L) = c(g/L) / M.
 *
 * @param formulaMass g/mol; needed only between a mass unit and a molar one
 * @throws EngineError FORMULA_MASS_MISSING
 */
export function convertConcentration(
  value: number,
  from: ConcentrationUnit,
  to: ConcentrationUnit,
  formulaMass?: number,
): number {
  const source = CONCENTRATION_UNITS[from];
  const target = CONCENTRATION_UNITS[to];
  const factor = source.perLitre / target.perLitre;
  if (source.isMolar === target.isMolar) return value * factor;
  if (formulaMass === undefined) {
    throw new EngineError(
      'FORMULA_MASS_MISSING',
      `convertConcentration needs a formula mass between ${from} and ${to}`,
    );
  }
  return source.isMolar ? value * factor * formulaMass : (value * factor) / formulaMass;
}
