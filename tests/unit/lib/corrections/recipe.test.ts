import { describe, expect, test } from 'vitest';
import { blankLedger } from '@/lib/corrections/ledger';
import { applyRecipe, RecipeError, type RecipeContext } from '@/lib/corrections/recipe';
import { RECIPE_VERSION, type Recipe } from '@/lib/corrections/recipe-types';
import { recipeSchema } from '@/lib/schemas/recipe';
import { at, gaussian, sampled } from '../../../support/bands';

const band = gaussian(510, 30, 0.8);
const blank = sampled((nm) => 0.05 + 0.0001 * (nm - 300));
const sample = sampled((nm) => 2 * band(nm) + 0.05 + 0.0001 * (nm - 300) + 0.02);
const context: RecipeContext = { spectra: { b: { name: 'Reagent blank', points: blank } }, pathLengthMm: 20 };

const recipe = (...steps: Recipe['steps']): Recipe => ({ version: RECIPE_VERSION, steps });
const takeBlank = {
  kind: 'subtractSpectrum',
  name: 'blank',
  role: 'blank',
  spectrumId: 'b',
  contains: ['reagents', 'cell'],
} as const;
const offset = { kind: 'offsetAt', name: 'offset', wavelengthNm: 700 } as const;
const path = { kind: 'normalisePath', name: 'to 10 mm', pathLengthMm: null } as const;

describe('applyRecipe', () => {
  // By construction: minus the blank, minus 0.02 at 700 nm where the band is gone, halved from 20 to 10 mm: the band.
  test('follows its steps in their order to the band they hide', () => {
    const done = applyRecipe(sample, recipe(takeBlank, offset, path), context);
    for (const nm of [450, 510, 560]) expect(at(done.points, nm)).toBeCloseTo(band(nm), 8);
    expect(done.steps.map(({ name }) => name)).toEqual(['blank', 'offset', 'to 10 mm']);
    expect(done.steps.every(({ did }) => did.length > 5)).toBe(true);
    expect(done).toMatchObject({ pathLengthMm: 10, smoothed: false, derivativeOrder: 0 });
  });

  test('is replayed to the same answer, touches nothing it was given, and stops where it is asked to', () => {
    const before = JSON.stringify([sample, context]);
    const once = applyRecipe(sample, recipe(takeBlank, offset), context);
    expect(applyRecipe(sample, recipe(takeBlank, offset), context)).toEqual(once);
    expect(JSON.stringify([sample, context])).toBe(before);
    const none = applyRecipe(sample, recipe(takeBlank, offset), context, 0);
    expect(none.points.absorbance).toEqual(sample.absorbance);
    expect(applyRecipe(sample, recipe(takeBlank, offset), context, 1).steps).toHaveLength(1);
  });

  test('says that it smoothed, and of which order a derivative is', () => {
    const smooth = { kind: 'smooth', name: 'calm', windowPoints: 9, polynomial: 2 } as const;
    const slope = { kind: 'derivative', name: 'slope', order: 1, windowPoints: 9, polynomial: 3 } as const;
    const done = applyRecipe(sample, recipe(smooth, slope), context);
    expect(done).toMatchObject({ smoothed: true, derivativeOrder: 1 });
  });

  test.each([
    [
      'a step after a derivative',
      [{ kind: 'derivative', name: 'd', order: 1, windowPoints: 9, polynomial: 3 }, offset],
      'AFTER_DERIVATIVE',
      '/steps/1',
    ],
    [
      'an average that is not first',
      [offset, { kind: 'average', name: 'mean', spectrumIds: ['b'] }],
      'AVERAGE_NOT_FIRST',
      '/steps/1',
    ],
    ['a second path', [path, path], 'TAKEN_OFF_TWICE', '/steps/1'],
    ['a wavelength outside', [{ ...offset, wavelengthNm: 900 }], 'WAVELENGTH_OUTSIDE', '/steps/0'],
  ] as const)('refuses %s and names the step', (_what, steps, code, pointer) => {
    const refused = () => applyRecipe(sample, recipe(...(steps as Recipe['steps'])), context);
    expect(refused).toThrow(RecipeError);
    expect(refused).toThrow(expect.objectContaining({ code, pointer }));
  });

  test('a version that is not known is refused', () => {
    expect(() => applyRecipe(sample, { version: 99, steps: [] }, context)).toThrow(/version 99/);
  });
});

describe('the schema of a recipe', () => {
  test('takes what is stored, and refuses an even window and a step without a name', () => {
    const stored = JSON.parse(JSON.stringify(recipe(takeBlank, offset, path))) as unknown;
    expect(recipeSchema.parse(stored)).toEqual(recipe(takeBlank, offset, path));
    const even = { kind: 'smooth', name: 'calm', windowPoints: 8, polynomial: 2 };
    expect(recipeSchema.safeParse({ version: RECIPE_VERSION, steps: [even] }).success).toBe(false);
    expect(recipeSchema.safeParse(recipe({ ...offset, name: ' ' })).success).toBe(false);
  });
});

describe('blankLedger', () => {
  const asked = {
    recipe: recipe(takeBlank),
    blankRule: 'subtract',
    methodBlankContains: ['solvent', 'reagents'],
    zeroedOn: ['instrument', 'cell'],
    blankThroughRecipe: false,
    spectrumNames: { b: 'Reagent blank' },
  } as const;

  test('says what each blank contains and takes off', () => {
    expect(blankLedger(asked).sentences).toEqual([
      'The instrument was zeroed on the drift of the instrument’s baseline and the cell.',
      'Step 1, “blank”: “Reagent blank” contains the reagents and the cell and takes off the reagents.',
      'The method’s blank contains the solvent and the reagents; its reading is subtracted and takes off the solvent and the reagents.',
    ]);
    const level = blankLedger({ ...asked, blankRule: 'level' }).sentences.at(-1);
    expect(level).toBe(
      'The method’s blank contains the solvent and the reagents; it is a level of the curve, so its intercept takes off the solvent and the reagents.',
    );
  });

  test('finds what would be taken off twice, by the method or by the same spectrum', () => {
    expect(blankLedger(asked).twice).toMatchObject([{ constituent: 'reagents', pointer: '/blankRule' }]);
    expect(blankLedger({ ...asked, blankThroughRecipe: true }).twice).toEqual([]);
    expect(blankLedger({ ...asked, blankRule: 'none' }).twice).toEqual([]);
    const again = { ...asked, blankRule: 'none', recipe: recipe(takeBlank, takeBlank) } as const;
    expect(blankLedger(again).twice).toMatchObject([{ constituent: 'spectrum', pointer: '/steps/1' }]);
  });
});
