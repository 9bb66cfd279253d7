import { create, type FactoryFunctionMap, qrDependencies, unitDependencies } from 'mathjs';

/**
 * Matrices and units of mathjs, as a second opinion on our own orthogonal decomposition and conversions, which are
 * faster and lose fewer digits (math.ts says by how much). Nothing that a page loads imports this file.
 */
export const { qr, unit } = create({ qrDependencies, unitDependencies } as FactoryFunctionMap);
