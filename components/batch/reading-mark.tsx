import { LightDisc } from '@/components/light-disc';
import { discAbsorbance, readingText, type ShownReading } from '@/lib/batch/reading-text';

/** One reading with its light disc, as it was read: before blank, path length and dilution. */
export function ReadingMark({
  reading,
  origin = 'typed',
  struck = false,
}: {
  reading: ShownReading;
  origin?: 'typed' | 'spectrum';
  struck?: boolean;
}) {
  const text = readingText(reading, origin);
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <LightDisc absorbance={discAbsorbance(reading)} reason={reading.value === null ? text : undefined} />
      {struck ? <del className="num text-ink-2">{text}</del> : <span className="num">{text}</span>}
    </span>
  );
}
