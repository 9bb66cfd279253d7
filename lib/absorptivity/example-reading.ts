import { unitWithBasis } from '@/lib/batch/unit-text';
import { resultFromKnownAbsorptivity } from '@/lib/engine';
import { roundPair, significantText } from '@/lib/format/round';
import { absorptivityFigures } from '@/lib/schemas/absorptivity';
import type { AbsorptivityTexts } from './form-start';
import { absorptivityRequest, type CalculatedAbsorptivity } from './stored-absorptivity';

/** The reading that the example is about, and a limit that it lies below whatever was set. */
const EXAMPLE = 0.5;
const LIMIT = 1;

/** Outside of these a slope is no help to anybody at the bench. */
const SHOWN_SLOPE = { least: 0.001, most: 3 };

type Figures = Pick<
  CalculatedAbsorptivity,
  'kind' | 'value' | 'u' | 'unit' | 'formulaMass' | 'pathLengthMm' | 'pathLengthUMm'
>;

/** What A = 0.5 means by an absorptivity in its path; u is that of absorptivity and path alone. */
function exampleResult(figures: Figures) {
  const request = absorptivityRequest({
    ...figures,
    ...{ signal: 'absorbance', source: 'as entered', conditions: '', readingSd: null },
    ...{ confidence: 0.95, absorbanceLimit: LIMIT },
  });
  const [result] = resultFromKnownAbsorptivity({ ...request, unknowns: [{ readings: [EXAMPLE] }] }).unknowns;
  return result?.measured ?? { value: NaN, u: 0 };
}

/** "A = 0.5 in 10 mm would mean 2.516 mg/L as Fe, with u = 0.023 mg/L …; 1 mg/L reads A = 0.1988." */
export function exampleSentence(figures: Figures & { readonly basis: string }): string {
  const { unit, basis, pathLengthMm } = figures;
  const { value, u } = exampleResult(figures);
  const { value: rounded, spread, exponent } = roundPair(value, u, 2);
  const plain = u === 0 || exponent !== null;
  const meaning = `${plain ? significantText(value, 4) : rounded} ${unitWithBasis(unit, basis)}`;
  const spreadText =
    u === 0
      ? ', with no uncertainty stated'
      : `, with u = ${plain ? significantText(u, 2) : spread} ${unit} from the absorptivity and the path`;
  const slope = EXAMPLE / value;
  const reads =
    slope >= SHOWN_SLOPE.least && slope <= SHOWN_SLOPE.most
      ? `; 1 ${unit} reads A = ${significantText(slope, 4)}`
      : '';
  return `A = ${EXAMPLE} in ${pathLengthMm} mm would mean ${meaning}${spreadText}${reads}.`;
}

/** The same from what is being typed, or what is still missing for it. */
export function exampleOfTexts(texts: AbsorptivityTexts): string {
  const parsed = absorptivityFigures.safeParse(texts);
  if (parsed.success) return exampleSentence({ ...parsed.data, basis: texts.basis });
  const formulaMass = parsed.error.issues.find(({ path }) => path[0] === 'formulaMass');
  return formulaMass
    ? `${formulaMass.message}.`
    : 'Enter the absorptivity, and this line says what a reading of A = 0.5 would mean.';
}
