'use client';

import { useDeferredValue, useMemo, useState } from 'react';
import { useGrid } from '@/components/grid/use-grid';
import { sampleNameOf } from '@/lib/batch/group-replicates';
import type { FormStart } from '@/lib/curve/form-start';
import { spectraSpec, spectraStandards, typedSpec, typedStandards } from '@/lib/curve/grid-standards';
import { liveCurve } from '@/lib/curve/live-curve';
import type { CurveDraftInput } from '@/lib/schemas/curve';
import type { SpectrumView } from '@/lib/views/spectrum';
import { useSpectrumReadings } from './use-spectrum-readings';

const LETTER = { absorbance: 'A', transmittance: 'T', percentTransmittance: '%T' } as const;
const NO_SPECTRA = new Map<string, never>();

function spectrumCells(start: FormStart, spectra: readonly SpectrumView[]): string[][] {
  const names = new Map(spectra.map(({ id, name }) => [id, name]));
  return start.spectrumIds.map((id, index) => [names.get(id) ?? '', ...(start.rows[index] ?? []), '']);
}

/** Everything that is typed into the form of a curve, and the standards it spells. */
function useEntries(start: FormStart, spectra: readonly SpectrumView[]) {
  const [source, setSource] = useState(start.source);
  const [about, setAbout] = useState(start.about);
  const [rule, setRule] = useState(start.rule);
  const [calculation, setCalculation] = useState(start.calculation);
  const [leftOut, setLeftOut] = useState(start.leftOut);
  const [spectrumIds, setSpectrumIds] = useState(start.spectrumIds);
  const typedGridSpec = useMemo(
    () => typedSpec(calculation.unit, LETTER[calculation.signal]),
    [calculation.unit, calculation.signal],
  );
  const spectraGridSpec = useMemo(
    () => spectraSpec(calculation.unit, spectrumIds.length),
    [calculation.unit, spectrumIds.length],
  );
  const [typed, dispatchTyped] = useGrid(typedGridSpec, start.source === 'typed' ? start.rows : []);
  const [fromSpectra, dispatchSpectra] = useGrid(spectraGridSpec, spectrumCells(start, spectra));

  function chooseSpectra(ids: readonly string[]) {
    const cells = new Map(spectrumIds.map((id, index) => [id, fromSpectra.rows[index]?.cells]));
    const names = new Map(spectra.map(({ id, name }) => [id, name]));
    const rows = ids.map((id) => {
      const name = names.get(id) ?? '';
      return cells.get(id) ?? [name, sampleNameOf(name), '', ''];
    });
    setSpectrumIds(ids);
    dispatchSpectra({ type: 'reset', rows });
  }

  const spelled = useMemo(
    () =>
      source === 'typed'
        ? typedStandards(typed.rows, leftOut)
        : spectraStandards(fromSpectra.rows, spectrumIds, leftOut),
    [source, typed.rows, fromSpectra.rows, spectrumIds, leftOut],
  );
  return {
    ...{ source, setSource, about, setAbout, rule, setRule, calculation, setCalculation },
    ...{ leftOut, setLeftOut, spectrumIds, chooseSpectra, spelled },
    typed: { spec: typedGridSpec, state: typed, dispatch: dispatchTyped },
    fromSpectra: { spec: spectraGridSpec, state: fromSpectra, dispatch: dispatchSpectra },
  };
}

/** A typed reading stands at a wavelength too, but nothing is read by a rule: the rest of it is empty. */
const typedRule = (at: string): CurveDraftInput['rule'] => ({
  rule: 'point',
  at,
  half: '',
  from: '',
  to: '',
  minus: '',
});

/** The form of a curve: entries, the draft that is sent, and what the engine says of it meanwhile. */
export function useCurveForm(notebookId: string, start: FormStart, spectra: readonly SpectrumView[]) {
  const entries = useEntries(start, spectra);
  const { source, about, rule, calculation, spelled, spectrumIds } = entries;
  const isTyped = source === 'typed';
  const readings = useSpectrumReadings(notebookId, isTyped ? [] : spectrumIds, rule);
  const draft = useMemo(
    (): CurveDraftInput => ({
      about,
      rule: isTyped ? typedRule(rule.at) : rule,
      calculation: isTyped ? calculation : { ...calculation, signal: 'absorbance' },
      standards: [...spelled.standards],
    }),
    [about, rule, calculation, spelled, isTyped],
  );
  const input = useMemo(
    () => ({
      calculation: draft.calculation,
      rule,
      standards: draft.standards,
      spectra: isTyped ? NO_SPECTRA : readings.spectra,
    }),
    [draft, rule, isTyped, readings.spectra],
  );
  const deferred = useDeferredValue(input);
  const live = useMemo(() => liveCurve(deferred), [deferred]);
  // the result beside the form may lag behind the last key; what is asked when the form is sent must not
  const liveNow = () => (deferred === input ? live : liveCurve(input));
  return { ...entries, draft, live, liveNow, readings };
}

export type CurveFormState = ReturnType<typeof useCurveForm>;
