'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Field } from '@/components/ui/field';
import { Table, Td, Th } from '@/components/ui/table';
import type { SpectrumView } from '@/lib/views/spectrum';

/** The spectra of the notebook to choose from, narrowed by name. */
export function SpectrumPicker({
  spectra,
  chosen,
  onChoose,
}: {
  spectra: readonly SpectrumView[];
  chosen: readonly string[];
  onChoose: (spectrumIds: readonly string[]) => void;
}) {
  const [search, setSearch] = useState('');
  const words = search.trim().toLowerCase();
  const shown = spectra.filter(({ name, fileName }) => `${name} ${fileName}`.toLowerCase().includes(words));
  const toggle = (id: string) =>
    onChoose(chosen.includes(id) ? chosen.filter((other) => other !== id) : [...chosen, id]);
  return (
    <Card
      flush
      title="Spectra of this notebook"
      aside={`${chosen.length} chosen`}
      actions={
        <>
          <Button
            size="small"
            onClick={() => onChoose([...new Set([...chosen, ...shown.map(({ id }) => id)])])}
          >
            Choose all shown
          </Button>
          <Button size="small" variant="quiet" onClick={() => onChoose([])}>
            Choose none
          </Button>
        </>
      }
    >
      <div className="border-b px-4 py-3">
        <Field
          name="search"
          label="Show those with"
          value={search}
          onChange={(event) => setSearch(event.target.value)}
          className="max-w-64"
        />
      </div>
      <div className="max-h-80 overflow-y-auto" tabIndex={0} role="group" aria-label="Spectra to choose from">
        <Table label="Spectra to choose from">
          <thead>
            <tr>
              <Th>Spectrum</Th>
              <Th>File</Th>
              <Th numeric>From, to, nm</Th>
            </tr>
          </thead>
          <tbody>
            {shown.map((spectrum) => (
              <tr key={spectrum.id}>
                <Td>
                  <label className="flex items-center gap-2.5">
                    <input
                      type="checkbox"
                      className="size-4.5 accent-uv"
                      checked={chosen.includes(spectrum.id)}
                      onChange={() => toggle(spectrum.id)}
                    />
                    {spectrum.name}
                  </label>
                </Td>
                <Td className="text-ink-2">{spectrum.fileName}</Td>
                <Td numeric>
                  {spectrum.fromNm} – {spectrum.toNm}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
        {shown.length === 0 && <p className="p-4 text-ink-2">No spectrum has that in its name or file.</p>}
      </div>
    </Card>
  );
}
