import { Table, Td, Th } from '@/components/ui/table';
import { nmText } from '@/lib/format/optical';
import type { GapReason } from '@/lib/readers/types';
import type { ReadingGap } from '@/lib/spectrum/reading-form';

const REASONS: Record<GapReason, string> = {
  aboveRange: 'above the range: hardly any light came through',
  belowRange: 'below the range of the instrument',
  missing: 'no reading',
  unreadable: 'not a number',
};

const SHOWN = 100;

/** Where a spectrum has no number, why, and what stood there. */
export function GapsTable({ gaps }: { gaps: readonly ReadingGap[] }) {
  return (
    <>
      <Table label="Gaps">
        <thead>
          <tr>
            <Th numeric>at, nm</Th>
            <Th>Why</Th>
            <Th>In the file</Th>
          </tr>
        </thead>
        <tbody>
          {gaps.slice(0, SHOWN).map((gap) => (
            <tr key={gap.index}>
              <Td numeric>{nmText(gap.wavelengthNm)}</Td>
              <Td>{REASONS[gap.reason]}</Td>
              <Td className="num">{gap.text || '–'}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {gaps.length > SHOWN && (
        <p className="border-t px-4 py-2 text-sm text-ink-2">
          The first {SHOWN} of {gaps.length} gaps.
        </p>
      )}
    </>
  );
}
