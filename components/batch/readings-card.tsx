import Link from 'next/link';
import type { ReactNode } from 'react';
import { Card } from '@/components/ui/card';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { SIGNAL_SYMBOL } from '@/lib/batch/reading-text';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import type { DeterminationDetail, DeterminationReadingView } from '@/lib/views/determination';
import { ReadingMark } from './reading-mark';

function Origin({ reading, base }: { reading: DeterminationReadingView; base: string }) {
  if (reading.spectrumId === null) return <>typed</>;
  return (
    <>
      <Link href={`${base}/spectra/${reading.spectrumId}`} className="text-uv underline underline-offset-2">
        spectrum
      </Link>
      {reading.rule && `, ${readingRuleWords(reading.rule)}`}
    </>
  );
}

/** Every reading of a determination with where it came from; those that were replaced stay, struck through. */
export function ReadingsCard({
  determination,
  base,
  correct,
}: {
  determination: DeterminationDetail;
  base: string;
  /** the way to correct a reading, where the reader may */
  correct?: (reading: DeterminationReadingView) => ReactNode;
}) {
  const all = [...determination.readings, ...determination.superseded].sort(
    (a, b) => a.position - b.position || b.createdAt.localeCompare(a.createdAt),
  );
  const replacedBy = new Map(all.map((reading) => [reading.supersedesId, reading]));
  return (
    <Card flush title="Readings" aside="as read: before blank, path length and dilution">
      <Table label="Readings">
        <thead>
          <tr>
            <Th>Reading</Th>
            <Th>As read</Th>
            <Th>From</Th>
            <Th>Remark</Th>
            {correct && (
              <Th>
                <span className="sr-only">Correct</span>
              </Th>
            )}
          </tr>
        </thead>
        <tbody>
          {all.map((reading) => {
            const gone = reading.supersededAt !== null;
            return (
              // a reading in use keeps its row when another takes its place, and with it an open correction
              <tr key={gone ? reading.id : `in use ${reading.position}`}>
                <RowHead className="font-normal">
                  {SIGNAL_SYMBOL[reading.signal]}
                  <sub>{reading.position}</sub>
                </RowHead>
                <Td>
                  <ReadingMark reading={reading} origin={reading.origin} struck={gone} />
                </Td>
                <Td className="text-ink-2">
                  <Origin reading={reading} base={base} />
                </Td>
                <Td className="text-ink-2">
                  {gone ? `superseded: ${replacedBy.get(reading.id)?.reason ?? ''}` : (reading.reason ?? '')}
                </Td>
                {correct && <Td className="text-right">{!gone && correct(reading)}</Td>}
              </tr>
            );
          })}
        </tbody>
      </Table>
    </Card>
  );
}
