/** What Halflight is not, and what comes before it. Read once by everybody, and at the foot of every page. */
export interface Caution {
  readonly title: string;
  readonly text: string;
}

export const CAUTIONS: readonly Caution[] = [
  {
    title: 'Not for diagnosis or treatment',
    text: 'Halflight is not a medical device. Use its results for research and quality control, never to diagnose or treat anybody.',
  },
  {
    title: 'The official text comes first',
    text: 'The official method, the law and the permits of the place, and the safety code of the laboratory come before anything shown here. Where they differ from it, follow them. What asks for a licensed, certified or otherwise competent person stays with that person.',
  },
  {
    title: 'It calculates and keeps a record',
    text: 'It does not validate a method, qualify an instrument or make a laboratory comply with a rule. Those are acts of the laboratory.',
  },
  {
    title: 'Templates and the demonstration are not validated methods',
    text: 'A template or an example is a place to begin. It counts as unvalidated until your own laboratory has verified it with its own instrument, reagents and samples.',
  },
  {
    title: 'Hazard notes remind, they do not instruct',
    text: 'A note on a method names the main hazard. The safety data sheet of each reagent and the rules of your laboratory decide how it is handled and disposed of.',
  },
  {
    title: 'Standards are named by number',
    text: 'What a standard asks for is told in our own words and in part. Read the original before you rely on it.',
  },
  {
    title: 'Records help with rules, and do not fulfil them',
    text: 'Accounts, the record of changes and reading without changing support the technical side of 21 CFR Part 11, Annex 11 of the EU GMP guide and ISO/IEC 17025. Procedures, training and validation are yours.',
  },
  {
    title: 'Aids are to be confirmed',
    text: 'A reading corrected at a second wavelength, an assumed path length, a value outside the standards or above the absorbance limit are aids. Confirm them by filtering, a measured cell or a dilution before you report.',
  },
  {
    title: 'Turbidity is not absorbance',
    text: 'A suspension scatters light. Its optical density, OD600 for instance, depends on the optics of the instrument and does not follow the Beer-Lambert law.',
  },
  {
    title: 'A molar absorptivity from a book is a guide',
    text: 'Published values differ by tens of per cent with pH, solvent and purity. For a result that is reported, use a standard curve of your own.',
  },
  {
    title: 'The demonstration is invented',
    text: 'Its laboratory, people, samples and results do not exist.',
  },
];

/** The same in a line, at the foot of every page, also for a reader who comes by a link. */
export const CAUTION_LINE =
  'For research and quality control, not for diagnosis. Official methods, local codes and licensed practice come first.';
