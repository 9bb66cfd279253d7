import Ajv2020 from 'ajv/dist/2020';
import { describe, expect, test } from 'vitest';
import {
  allLimits,
  calculateStandardCurve,
  type CurveRequest,
  resultFromKnownAbsorptivity,
} from '@/lib/engine';
import { CALCULATIONS, openApiDocument } from '@/lib/schemas/openapi';
import { request, standardsOf, unknown } from '../engine/requests';

type Json = Record<string, never>;
const document = JSON.parse(JSON.stringify(openApiDocument())) as {
  openapi: string;
  paths: Record<string, { post: { requestBody: Json; responses: Record<string, Json> } }>;
};
const ajv = new Ajv2020({ strict: false, allErrors: true });

/** The schema of a body in the published document, as a stranger would take it from there. */
function schemaOf(path: string, part: 'request' | 'answer') {
  const post = document.paths[path]?.post as unknown as {
    requestBody: { content: Record<string, { schema: object }> };
    responses: Record<string, { content: Record<string, { schema: object }> }>;
  };
  const content = part === 'request' ? post.requestBody.content : post.responses['200']?.content;
  return ajv.compile(content?.['application/json']?.schema ?? {});
}

function valid(path: string, part: 'request' | 'answer', body: unknown) {
  const validate = schemaOf(path, part);
  validate(JSON.parse(JSON.stringify(body)));
  return (validate.errors ?? []).map((error) => `${error.instancePath} ${error.message}`);
}

const CURVE = '/api/v1/calculations/standard-curve';
const ABSORPTIVITY = '/api/v1/calculations/known-absorptivity';
const LIMITS = '/api/v1/calculations/limits';

const six = [0.5, 1, 2, 4, 6, 8];
const REQUESTS: readonly CurveRequest[] = [
  request({
    formulaMass: 55.845,
    unknowns: [unknown([0.35, 0.351]), unknown([0.001]), unknown([0.9]), unknown(['OVER'])],
  }),
  request({
    model: 'quadratic',
    weighting: '1/x',
    standards: standardsOf([0, ...six], [0.001, ...six.map((c) => 0.1 * c - 0.001 * c * c)]),
    unknowns: [unknown([0.3]), unknown([9])],
    glassware: { pipettesMl: [5], flasksMl: [50] },
    recovery: { value: 0.9, u: 0.01 },
  }),
  request({
    model: 'proportional',
    blank: { readings: [0.002, 0.003], use: 'subtract' },
    unknowns: [
      unknown([{ main: 0.4, minus: 0.01 }], {
        dilution: [
          { takenMl: 5, toMl: 50, takenWare: { toleranceMl: 0.015, piece: 'P' } },
          { takenG: 1, toG: 10, densities: { takenGPerMl: 1.1, toGPerMl: 1 } },
        ],
        wingEstimate: 3,
      }),
    ],
  }),
  request({
    standards: standardsOf([1, 2, 3, 4], [0.1, 0.3, 0.15, 0.35]),
    unknowns: [unknown([0.2])],
    standardsShared: [{ source: 'purity', relativeU: 0.01 }],
  }),
  request({
    standards: [
      ...request().standards,
      { concentration: 10, readings: ['OVER', 1.01], excludedReadings: [1] },
    ],
  }),
];

describe('the document', () => {
  test('is OpenAPI 3.1 and names the three calculations', () => {
    expect(document.openapi).toBe('3.1.0');
    expect(Object.keys(document.paths).sort()).toEqual(Object.keys(CALCULATIONS).sort());
  });

  test.each(REQUESTS.map((body, i) => [i, body] as const))(
    'takes curve request %i and holds its answer',
    (_i, body) => {
      expect(valid(CURVE, 'request', body)).toEqual([]);
      expect(CALCULATIONS[CURVE].request.safeParse(body).success).toBe(true);
      expect(valid(CURVE, 'answer', calculateStandardCurve(body))).toEqual([]);
    },
  );

  test('takes a request by a known absorptivity and holds its answer', () => {
    const body = {
      signal: 'absorbance' as const,
      pathLengthMm: 10,
      unit: 'mg/L' as const,
      formulaMass: 55.845,
      confidence: 0.95,
      absorbanceLimit: 2,
      absorptivity: { kind: 'molar' as const, value: 11100, u: 60, source: 'paper' },
      blank: { readings: [0.002, 0.003] },
      unknowns: [
        { readings: [0.4, 0.41] },
        { readings: [2.4] },
        { readings: ['OVER'] },
        { readings: [0.002] },
      ],
    };
    expect(valid(ABSORPTIVITY, 'request', body)).toEqual([]);
    expect(CALCULATIONS[ABSORPTIVITY].request.safeParse(body).success).toBe(true);
    expect(valid(ABSORPTIVITY, 'answer', resultFromKnownAbsorptivity(body))).toEqual([]);
  });

  test('takes a request for limits and holds its answer', () => {
    const seven = Array.from({ length: 7 }, (_, i) => ({ value: 0.1 + i / 100, batch: 'B1' }));
    const body = {
      unit: 'mg/L' as const,
      curve: request(),
      readings: 2,
      blankReadings: [0.001, 0.002, 0.0015],
      factor: 2,
      study: { spikeLevel: 5, spikes: seven, blanks: [{ value: null }] },
    };
    expect(valid(LIMITS, 'request', body)).toEqual([]);
    expect(CALCULATIONS[LIMITS].request.safeParse(body).success).toBe(true);
    expect(valid(LIMITS, 'answer', allLimits(body))).toEqual([]);
    expect(valid(LIMITS, 'answer', allLimits({ unit: 'mg/L' }))).toEqual([]);
  });

  test.each([
    [CURVE, { ...request(), pathLenghtMm: 5 }],
    [CURVE, { ...request(), standards: [{ concentration: '1', readings: [1] }] }],
    [ABSORPTIVITY, { unit: 'mg/L' }],
    [LIMITS, { unit: 'mg/L', alpha: '5 %' }],
  ])('refuses what the route of %s refuses', (path, body) => {
    expect(valid(path, 'request', body)).not.toEqual([]);
    expect(CALCULATIONS[path as typeof CURVE].request.safeParse(body).success).toBe(false);
  });
});
