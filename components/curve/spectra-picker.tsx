'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { nmRangeText } from '@/lib/format/optical';
import type { SpectrumView } from '@/lib/views/spectrum';

function SpectrumChoice({
  spectrum,
  chosen,
  onChoose,
}: {
  spectrum: SpectrumView;
  chosen: boolean;
  onChoose: (chosen: boolean) => void;
}) {
  return (
    <li>
      <label className="flex items-start gap-2.5 px-3 py-1.5 hover:bg-raised">
        <input
          type="checkbox"
          className="mt-0.5 size-4.5 shrink-0 accent-uv"
          checked={chosen}
          onChange={(event) => onChoose(event.currentTarget.checked)}
        />
        <span className="min-w-0">
          <span className="font-medium">{spectrum.name}</span>{' '}
          <span className="text-sm text-ink-2">
            {spectrum.fileName !== spectrum.name && `${spectrum.fileName}, `}
            <span className="num">{nmRangeText(spectrum.fromNm, spectrum.toNm)}</span>
          </span>
        </span>
      </label>
    </li>
  );
}

/** Choose spectra of the notebook in a dialog; the order is that of the list. */
export function SpectraPicker({
  spectra,
  chosen,
  onChange,
}: {
  spectra: readonly SpectrumView[];
  chosen: readonly string[];
  onChange: (ids: readonly string[]) => void;
}) {
  const [open, setOpen] = useState(false);
  const [search, setSearch] = useState('');
  const found = spectra.filter(({ name, fileName }) =>
    `${name} ${fileName}`.toLowerCase().includes(search.trim().toLowerCase()),
  );
  const set = (ids: readonly string[], on: boolean) => {
    const next = new Set(chosen);
    for (const id of ids)
      if (on) next.add(id);
      else next.delete(id);
    // kept rows stay where they are; new ones follow in the order of the list
    const added = spectra.flatMap(({ id }) => (next.has(id) && !chosen.includes(id) ? [id] : []));
    onChange([...chosen.filter((id) => next.has(id)), ...added]);
  };
  const foundIds = found.map(({ id }) => id);
  return (
    <Dialog
      open={open}
      onOpenChange={setOpen}
      wide
      title="Spectra of the standards"
      description="Each gives one reading. Spectra with the same standard name and concentration are readings of one standard."
      trigger={<Button>{chosen.length === 0 ? 'Choose spectra' : 'Choose other spectra'}</Button>}
    >
      <div className="grid gap-3">
        <Field
          name="spectra-search"
          label="Find by name"
          value={search}
          onChange={(event) => setSearch(event.currentTarget.value)}
        />
        <div className="flex flex-wrap gap-2">
          <Button size="small" onClick={() => set(foundIds, true)}>
            Choose all {found.length}
          </Button>
          <Button size="small" variant="quiet" onClick={() => set(foundIds, false)}>
            Choose none
          </Button>
        </div>
        <ul aria-label="Spectra" tabIndex={0} className="max-h-72 overflow-y-auto rounded-control border">
          {found.map((spectrum) => (
            <SpectrumChoice
              key={spectrum.id}
              spectrum={spectrum}
              chosen={chosen.includes(spectrum.id)}
              onChoose={(on) => set([spectrum.id], on)}
            />
          ))}
          {found.length === 0 && <li className="px-3 py-2 text-ink-2">No spectrum has this in its name.</li>}
        </ul>
        <div>
          <Button variant="primary" onClick={() => setOpen(false)}>
            {chosen.length === 1 ? 'Take this spectrum' : `Take these ${chosen.length} spectra`}
          </Button>
        </div>
      </div>
    </Dialog>
  );
}
