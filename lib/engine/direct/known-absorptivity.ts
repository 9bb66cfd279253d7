import { EngineError } from '../errors';
import { type Flag, flag } from '../flags';
import { requireChoice, requireNotNegative, requirePositive } from '../checks/require';
import { CONCENTRATION_UNITS, isMolar } from '../units';
import { calculateDirect } from './calculate-direct';
import { acceptDirect } from './check-direct';
import { directBlanks } from './direct-blanks';
import type { DirectMethod } from './method';
import type { AbsorptivityKind, DirectAnswer, KnownAbsorptivityRequest } from './types';

const KINDS = {
  molar: { unit: 'L/(mol cm)', name: 'molar absorptivity' },
  percent: { unit: '100 mL/(g cm)', name: 'absorbance of 1 % in 1 cm' },
  specific: { unit: 'L/(g cm)', name: 'specific absorptivity' },
} as const satisfies Record<AbsorptivityKind, object>;

/**
 * Concentrations by a known absorptivity:
 *
 *     c = A / (ε l) in mol/L        c = 10 A / (E l) in g/L        c = A / (a l) in g/L        l in cm
 *
 * with the readings, blank, path, dilution and recovery of the unknowns as on a curve. (u_c/c)² holds those and
 * (u_ε/ε)².
 *
 * @throws EngineError ABSORPTIVITY_NOT_POSITIVE, SOURCE_MISSING, FORMULA_MASS_MISSING and those of any unknown
 * @source Beer-Lambert law; E(1 %, 1 cm) as in Ph. Eur. 2.2.25
 */
export function resultFromKnownAbsorptivity(asked: KnownAbsorptivityRequest): DirectAnswer {
  const request = acceptDirect(asked);
  checkAbsorptivity(request);
  return calculateDirect(absorptivityMethod(request));
}

function checkAbsorptivity({ absorptivity, formulaMass }: KnownAbsorptivityRequest): void {
  const { kind, value, u, source } = absorptivity;
  requireChoice(kind, Object.keys(KINDS), 'the kind of absorptivity', '/absorptivity/kind');
  requirePositive(value, 'ABSORPTIVITY_NOT_POSITIVE', 'the absorptivity', '/absorptivity/value');
  requireNotNegative(u, 'the uncertainty of the absorptivity', '/absorptivity/u');
  requirePositive(formulaMass, 'FORMULA_MASS_NOT_POSITIVE', 'the formula mass (g/mol)', '/formulaMass');
  if (source.trim() === '') {
    throw new EngineError(
      'SOURCE_MISSING',
      'a known absorptivity needs to say where it comes from',
      '/absorptivity/source',
    );
  }
}

/** From A per cm over the absorptivity to the unit asked for. */
export function unitFactor({ absorptivity, unit, formulaMass }: KnownAbsorptivityRequest): number {
  const { perLitre } = CONCENTRATION_UNITS[unit];
  const inMoles = absorptivity.kind === 'molar';
  const coherent = (absorptivity.kind === 'percent' ? 10 : 1) / perLitre;
  if (inMoles === isMolar(unit)) return coherent;
  if (formulaMass === undefined) {
    throw new EngineError(
      'FORMULA_MASS_MISSING',
      `a ${KINDS[absorptivity.kind].name} gives ${unit} only with a formula mass`,
      '/formulaMass',
    );
  }
  return inMoles ? coherent * formulaMass : coherent / formulaMass;
}

function absorptivityMethod(request: KnownAbsorptivityRequest): DirectMethod {
  const { absorptivity, unit } = request;
  const { value, u, source, kind, conditions } = absorptivity;
  const factor = unitFactor(request);
  const perAbsorbance = factor / value;
  const facts = KINDS[kind];
  return {
    request,
    measuring: { request, blanks: directBlanks(request), range: { min: 0, max: Infinity } },
    basis: `${facts.name} ${value} ${facts.unit} (${source}${conditions ? `; ${conditions}` : ''})`,
    flags: judgeAbsorptivity(request),
    pathCancels: false,
    absorbanceAt: (concentration) => concentration / perAbsorbance,
    read: (y0) => ({
      c: y0 * perAbsorbance,
      perAbsorbance,
      perExpression: '(f / E)',
      expression: 'y0 / E * f',
      source: 'Beer-Lambert law',
      from: { E: 'method.absorptivity', f: 'method.factor' },
      errors: [],
    }),
    factors: [
      {
        id: 'method.absorptivity',
        label: 'absorptivity',
        symbol: 'E',
        unit: facts.unit,
        value,
        power: -1,
        spreads: [{ shape: 'normal', u }],
        source,
      },
    ],
    record: (ledger) => {
      ledger.given(
        { id: 'method.absorptivity', label: facts.name, symbol: 'E', unit: facts.unit, source },
        value,
      );
      ledger.solved(
        {
          id: 'method.factor',
          label: 'From absorbance per cm over absorptivity to the unit',
          symbol: 'f',
          unit: '',
          source: `unit ${unit}${request.formulaMass === undefined ? '' : `, formula mass ${request.formulaMass} g/mol`}`,
        },
        '1 / (unit in g/L or mol/L), times 10 for 1 %, times or over the formula mass across mass and amount',
        [],
        factor,
      );
    },
    judge: () => [],
  };
}

function judgeAbsorptivity({ absorptivity }: KnownAbsorptivityRequest): readonly Flag[] {
  return [
    ...(absorptivity.u === 0 ? [flag('ABSORPTIVITY_WITHOUT_U', { value: absorptivity.value })] : []),
    ...(absorptivity.conditions?.trim() ? [] : [flag('ABSORPTIVITY_WITHOUT_CONDITIONS')]),
  ];
}
