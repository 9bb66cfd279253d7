import { nmRangeText } from '@/lib/format/optical';

const WORDS = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];

interface Span {
  readonly fromNm: number;
  readonly toNm: number;
}

/** What is there, as a title: "Seven spectra, 400–700 nm". */
export function spectraInWords(count: number, spans: readonly Span[]): string {
  if (count === 0) return 'No spectra yet';
  const amount = `${WORDS[count] ?? count} ${count === 1 ? 'spectrum' : 'spectra'}`;
  if (spans.length === 0) return amount;
  const from = Math.min(...spans.map((span) => span.fromNm));
  const to = Math.max(...spans.map((span) => span.toNm));
  return `${amount}, ${nmRangeText(from, to)}`;
}
