/** The version that is written now. A recipe keeps the version it was made with. */
export const RECIPE_VERSION = 1;

/** What a blank can hold and a correction can take off. */
export const CONSTITUENTS = [
  'instrument',
  'cell',
  'solvent',
  'reagents',
  'sampleColour',
  'turbidity',
] as const;
export type Constituent = (typeof CONSTITUENTS)[number];

interface Named {
  /** The person's own name for the step. */
  readonly name: string;
}

export type RecipeStep = Named &
  (
    | {
        readonly kind: 'subtractSpectrum';
        readonly role: 'blank' | 'baseline';
        readonly spectrumId: string;
        /** What is in it, by the person's word. */
        readonly contains: readonly Constituent[];
      }
    | {
        readonly kind: 'sampleBlank';
        readonly spectrumId: string;
        readonly contains: readonly Constituent[];
        readonly sampleDilution: number;
        readonly blankDilution: number;
        readonly ratioRelativeU?: number | undefined;
      }
    | { readonly kind: 'offsetAt'; readonly wavelengthNm: number }
    | { readonly kind: 'offsetByWindow'; readonly fromNm: number; readonly toNm: number }
    | { readonly kind: 'straightBaseline'; readonly lowNm: number; readonly highNm: number }
    | {
        readonly kind: 'threePointBaseline';
        readonly lowNm: number;
        readonly middleNm: number;
        readonly highNm: number;
      }
    | { readonly kind: 'scatter'; readonly fromNm: number; readonly toNm: number }
    | { readonly kind: 'smooth'; readonly windowPoints: number; readonly polynomial: number }
    | {
        readonly kind: 'derivative';
        readonly order: number;
        readonly windowPoints: number;
        readonly polynomial: number;
      }
    | { readonly kind: 'average'; readonly spectrumIds: readonly string[] }
    | {
        readonly kind: 'interpolate';
        readonly fromNm: number;
        readonly toNm: number;
        readonly stepNm: number;
      }
    | {
        readonly kind: 'normalisePath';
        /** Null: the path length that stands with the spectrum. */
        readonly pathLengthMm: number | null;
        readonly uMm?: number | undefined;
      }
  );

export type StepKind = RecipeStep['kind'];

/** Ordered steps, as stored: plain JSON. */
export interface Recipe {
  readonly version: number;
  readonly steps: readonly RecipeStep[];
}
