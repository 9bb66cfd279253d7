import { Disclosure } from '@/components/ui/disclosure';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { WARE, type WareItem } from '@/lib/engine/dilution/ware';
import { significantText } from '@/lib/format/round';

/** Class B is twice class A throughout, so it needs no rows of its own. */
const shown = WARE.filter(({ className }) => className !== 'class B');

const volume = (ml: number) =>
  ml < 1 ? `${significantText(1000 * ml, 6)} µL` : `${significantText(ml, 6)} mL`;

function Row({ item }: { item: WareItem }) {
  return (
    <tr>
      <RowHead className="font-normal">
        {item.kind}, {item.standard} {item.className}
      </RowHead>
      <Td numeric>{volume(item.nominalMl)}</Td>
      <Td numeric>±{volume(item.toleranceMl)}</Td>
      <Td numeric>{item.repeatabilityMl === undefined ? '' : volume(item.repeatabilityMl)}</Td>
      <Td className="text-sm text-ink-2">
        {item.basis === 'published' ? 'seen in print' : 'from memory: check it against the standard'}
      </Td>
    </tr>
  );
}

/** The tolerances that "class A" behind a dilution stands for. Any of them is overruled by one that is typed. */
export function WareTable() {
  return (
    <Disclosure summary="Tolerances of glassware and pipettes, and how to write them">
      <div className="grid gap-3">
        <p className="max-w-prose text-sm">
          Write what stands on the vessel behind its volume, <span className="num">10 ±0.02 in 100 ±0.1</span>
          , or the class of your glassware, <span className="num">10 in 100 class A</span> (ISO;{' '}
          <span className="num">ASTM class A</span> for the others; class B has twice the tolerance). A
          certificate of your own comes before this table: type its number. Nothing written means that the
          volumes add nothing to the uncertainty.
        </p>
        <Table label="Tolerances of volumetric ware" tall>
          <thead>
            <tr>
              <Th>Vessel</Th>
              <Th numeric>Volume</Th>
              <Th numeric>Tolerance</Th>
              <Th numeric>Repeats to</Th>
              <Th>Whence</Th>
            </tr>
          </thead>
          <tbody>
            {shown.map((item) => (
              <Row key={item.id} item={item} />
            ))}
          </tbody>
        </Table>
      </div>
    </Disclosure>
  );
}
