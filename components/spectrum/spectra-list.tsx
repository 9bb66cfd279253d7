'use client';

import Link from 'next/link';
import { memo, useRef, useState } from 'react';

import { LightDisc } from '@/components/light-disc';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { absorbanceText, nmRangeText } from '@/lib/format/optical';
import { LIMITS } from '@/lib/limits';
import type { SpectrumView } from '@/lib/views/spectrum';

interface RowProps {
  spectrum: SpectrumView;
  checked: boolean;
  onCheck: (id: string, checked: boolean, range: boolean) => void;
}

const Row = memo(function Row({ spectrum, checked, onCheck }: RowProps) {
  const { id, notebookId, name, fileName, highestAbsorbance: highest } = spectrum;
  return (
    <tr>
      <RowHead>
        <span className="flex min-w-40 items-center gap-2.5">
          <input
            type="checkbox"
            aria-label={`Plot ${name} of ${fileName}`}
            className="size-4.5 shrink-0 accent-uv"
            checked={checked}
            onChange={(event) => {
              const { shiftKey } = event.nativeEvent as unknown as { shiftKey?: boolean }; // a click's own member
              onCheck(id, event.currentTarget.checked, shiftKey === true);
            }}
          />
          <Link href={`/notebooks/${notebookId}/spectra/${id}`} className="hover:underline">
            {name}
          </Link>
          {spectrum.voided && <Pill>set aside</Pill>}
        </span>
      </RowHead>
      <Td className="max-w-48 truncate text-ink-2">{fileName}</Td>
      <Td numeric>{nmRangeText(spectrum.fromNm, spectrum.toNm)}</Td>
      <Td numeric>
        {spectrum.pointCount}
        {spectrum.gapCount > 0 && <span className="aside"> ({spectrum.gapCount} gaps)</span>}
      </Td>
      <Td numeric>
        {highest === null ? (
          <span className="aside">not absorbance</span>
        ) : (
          <>
            <LightDisc absorbance={highest} className="mr-2" />
            {absorbanceText(highest)}
          </>
        )}
      </Td>
    </tr>
  );
});

function matches(spectrum: SpectrumView, search: string): boolean {
  const text = search.trim().toLowerCase();
  return spectrum.name.toLowerCase().includes(text) || spectrum.fileName.toLowerCase().includes(text);
}

/** The spectra to choose from: search, tick, tick a range with Shift, choose all that are shown. */
export function SpectraList({
  spectra,
  total,
  chosenIds,
  aside,
  onChoose,
  onAside,
}: {
  spectra: readonly SpectrumView[];
  /** how many the notebook holds; more than `spectra` when it is very large */
  total: number;
  chosenIds: readonly string[];
  aside: boolean;
  onChoose: (ids: readonly string[]) => void;
  onAside: (aside: boolean) => void;
}) {
  const [search, setSearch] = useState('');
  const last = useRef<string | null>(null);
  const setAsideCount = spectra.filter((spectrum) => spectrum.voided).length;
  const shown = spectra.filter((spectrum) => (aside || !spectrum.voided) && matches(spectrum, search));
  const chosen = new Set(chosenIds);

  function check(id: string, checked: boolean, range: boolean): void {
    const ids = shown.map((spectrum) => spectrum.id);
    const ends = [ids.indexOf(last.current ?? id), ids.indexOf(id)].sort((a, b) => a - b);
    const touched = range && (ends[0] ?? -1) >= 0 ? ids.slice(ends[0], (ends[1] ?? 0) + 1) : [id];
    last.current = id;
    const kept = chosenIds.filter((other) => !touched.includes(other));
    onChoose(checked ? [...kept, ...touched].slice(0, LIMITS.spectraAtOnce) : kept);
  }
  function chooseShown(): void {
    const ids = new Set([...chosenIds, ...shown.map((spectrum) => spectrum.id)]);
    onChoose([...ids].slice(0, LIMITS.spectraAtOnce));
  }

  return (
    <Card flush title="Spectra" aside={`${chosen.size} of ${total} in the plot`}>
      <div className="flex flex-wrap items-end gap-3 border-b p-4">
        <Field
          name="find"
          label="Find by name or file"
          type="search"
          value={search}
          onChange={(event) => setSearch(event.currentTarget.value)}
          className="min-w-0 flex-1 basis-52"
        />
        <Button onClick={chooseShown}>{search === '' ? 'Choose all' : `Choose these ${shown.length}`}</Button>
        <Button onClick={() => onChoose([])}>Choose none</Button>
        {setAsideCount > 0 && (
          <Checkbox
            name="aside"
            label={`List the ${setAsideCount} set aside too`}
            checked={aside}
            onChange={(event) => onAside(event.currentTarget.checked)}
          />
        )}
      </div>
      <div className="max-h-120 overflow-y-auto">
        {shown.length === 0 ? (
          <p className="p-4 text-ink-2">No name or file holds “{search}”.</p>
        ) : (
          <Table label="Spectra to choose from">
            <thead>
              <tr>
                <Th>Spectrum</Th>
                <Th>File</Th>
                <Th numeric>Range</Th>
                <Th numeric>Points</Th>
                <Th numeric>Highest A</Th>
              </tr>
            </thead>
            <tbody>
              {shown.map((spectrum) => (
                <Row
                  key={spectrum.id}
                  spectrum={spectrum}
                  checked={chosen.has(spectrum.id)}
                  onCheck={check}
                />
              ))}
            </tbody>
          </Table>
        )}
      </div>
      {total > spectra.length && (
        <p className="border-t px-4 py-2 text-sm text-ink-2">
          The newest {spectra.length} of {total} are listed.
        </p>
      )}
      {chosen.size >= LIMITS.spectraAtOnce && (
        <p className="border-t px-4 py-2 text-sm text-ink-2">
          {LIMITS.spectraAtOnce} spectra are as many as one plot takes.
        </p>
      )}
    </Card>
  );
}
