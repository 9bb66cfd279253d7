import type { Model, Weighting } from '@/lib/engine';

/** Short names of models and weightings, for tables and facts. */
export const MODEL_WORDS: Readonly<Record<Model, string>> = {
  linear: 'line',
  proportional: 'line through zero',
  quadratic: 'quadratic',
};
export const WEIGHTING_WORDS: Readonly<Record<Weighting, string>> = {
  none: 'unweighted',
  '1/x': '1/x',
  '1/x2': '1/x²',
  '1/y': '1/y',
  '1/y2': '1/y²',
  varianceFunction: 'by its variance function',
  replicates: 'by its replicates',
  given: 'given weights',
};

export const modelWords = (model: Model, weighting: Weighting) =>
  `${MODEL_WORDS[model]}, ${WEIGHTING_WORDS[weighting]}`;
