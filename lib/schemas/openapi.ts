import { OpenApiGeneratorV31, OpenAPIRegistry } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import { standardCurveCalculation } from './calculation';
import { knownAbsorptivityAnswer, limitsAnswer, standardCurveAnswer } from './calculation-answers';
import { knownAbsorptivityCalculation } from './known-absorptivity';
import { limitsCalculation } from './limits-calculation';

/** Refusals of every route (RFC 9457). */
export const problem = z.strictObject({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  detail: z.string(),
  code: z.string(),
  errors: z.array(z.strictObject({ pointer: z.string(), detail: z.string() })),
});

/** The public calculations: what they take and what they answer. Routes, document and test read this one list. */
export const CALCULATIONS = {
  '/api/v1/calculations/standard-curve': {
    operationId: 'calculateStandardCurve',
    summary: 'Fit a standard curve and read unknowns back through it',
    request: standardCurveCalculation,
    answer: standardCurveAnswer,
  },
  '/api/v1/calculations/known-absorptivity': {
    operationId: 'calculateByKnownAbsorptivity',
    summary: 'Concentrations by a known molar absorptivity, E(1 %, 1 cm) or specific absorptivity',
    request: knownAbsorptivityCalculation,
    answer: knownAbsorptivityAnswer,
  },
  '/api/v1/calculations/limits': {
    operationId: 'calculateLimits',
    summary: 'Every limit of detection and quantitation that the data allow',
    request: limitsCalculation,
    answer: limitsAnswer,
  },
} as const;

const PROBLEMS = {
  400: 'The body is not JSON',
  401: 'Neither a session nor a token',
  422: 'A value that cannot be read or calculated with, by its JSON pointer',
} as const;

/** The OpenAPI 3.1 document, made from the schemas that the routes themselves parse with. */
export function openApiDocument() {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'token', { type: 'http', scheme: 'bearer' });
  for (const [path, { operationId, summary, request, answer }] of Object.entries(CALCULATIONS)) {
    registry.registerPath({
      method: 'post',
      path,
      operationId,
      summary,
      description: 'Calculates and keeps nothing. Asks for a session of the notebook or for a token.',
      security: [{ token: [] }],
      request: { body: { required: true, content: { 'application/json': { schema: request } } } },
      responses: {
        200: { description: 'What was calculated', content: { 'application/json': { schema: answer } } },
        ...Object.fromEntries(
          Object.entries(PROBLEMS).map(([status, description]) => [
            status,
            { description, content: { 'application/problem+json': { schema: problem } } },
          ]),
        ),
      },
    });
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Halflight',
      version: '1',
      description:
        'Calculations of UV-Vis absorbance quantitation. Concentrations are in the unit of the request, absorbances per 10 mm unless named as read.',
    },
  });
}
