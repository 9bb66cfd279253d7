import Link from 'next/link';
import { Card } from '@/components/ui/card';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { DeterminationView } from '@/lib/views/determination';
import { ReadingMark } from './reading-mark';

/** Determinations that were declared void: kept to be seen, and in no count, copy or file. */
export function VoidDeterminations({
  determinations,
  here,
}: {
  determinations: readonly DeterminationView[];
  here: string;
}) {
  return (
    <Card flush title="Void" aside="kept to be seen; they are in no copy and no file">
      <Table label="Void determinations">
        <thead>
          <tr>
            <Th>Sample</Th>
            <Th>Readings</Th>
            <Th>Why it is void</Th>
          </tr>
        </thead>
        <tbody>
          {determinations.map((one) => (
            <tr key={one.id}>
              <RowHead>
                <Link
                  href={`${here}/determinations/${one.id}`}
                  className="line-through underline-offset-2 hover:underline"
                >
                  {one.sample}
                </Link>
              </RowHead>
              <Td>
                <span className="flex flex-wrap gap-x-3">
                  {one.readings.map((reading) => (
                    <ReadingMark key={reading.id} reading={reading} origin={reading.origin} struck />
                  ))}
                </span>
              </Td>
              <Td className="text-ink-2">{one.voidReason}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Card>
  );
}
