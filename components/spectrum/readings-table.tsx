import { SeriesSwatch } from '@/components/charts/series-swatch';
import { spectrumLooks, type SpectrumToDraw } from '@/components/charts/spectrum-look';
import { LightDisc } from '@/components/light-disc';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { absorbanceText, lightThroughText, nmText } from '@/lib/format/optical';
import type { SpectrumReadingView } from '@/lib/views/spectrum';

function GapCells({ reading, span }: { reading: SpectrumReadingView; span: number }) {
  const words = reading.error ?? `no number here: ${reading.gapText ?? 'a gap'}`;
  return (
    <Td colSpan={span} className="text-right text-sm text-ink-2">
      <span className="mr-2">{words}</span>
      <LightDisc absorbance={null} silent />
    </Td>
  );
}

/** T, the light disc and A of each spectrum as read; with a second wavelength also what was taken off and the rest. */
export function ReadingsTable({
  readings,
  drawn,
  showsPlace,
  hasMinus,
}: {
  readings: readonly SpectrumReadingView[];
  drawn: readonly SpectrumToDraw[];
  /** true when the place differs from spectrum to spectrum (a maximum) */
  showsPlace: boolean;
  hasMinus: boolean;
}) {
  const looks = spectrumLooks(drawn);
  const span = 2 + (showsPlace ? 1 : 0) + (hasMinus ? 2 : 0);
  return (
    <Table label="Readings" tall>
      <thead>
        <tr>
          <Th>Spectrum</Th>
          {showsPlace && <Th numeric>at, nm</Th>}
          <Th numeric>T</Th>
          <Th numeric>A</Th>
          {hasMinus && <Th numeric>minus</Th>}
          {hasMinus && <Th numeric>difference</Th>}
        </tr>
      </thead>
      <tbody>
        {readings.map((reading) => {
          const look = looks.get(reading.spectrumId);
          const main = reading.mainValue;
          return (
            <tr key={reading.spectrumId}>
              <RowHead>
                {look && <SeriesSwatch look={look} />}
                {reading.name}
              </RowHead>
              {reading.error || main === null ? (
                <GapCells reading={reading} span={span} />
              ) : (
                <>
                  {showsPlace && <Td numeric>{reading.atNm === null ? '' : nmText(reading.atNm)}</Td>}
                  <Td numeric>{lightThroughText(main)}</Td>
                  <Td numeric className={reading.absorbanceLimitExceeded ? 'text-red' : undefined}>
                    <LightDisc absorbance={main} className="mr-2" />
                    {absorbanceText(main)}
                  </Td>
                  {hasMinus && (
                    <Td numeric>
                      {reading.minusValue === null ? 'gap' : absorbanceText(reading.minusValue)}
                    </Td>
                  )}
                  {hasMinus && (
                    <Td numeric>{reading.value === null ? 'none' : absorbanceText(reading.value)}</Td>
                  )}
                </>
              )}
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}
