'use client';

import { useReducer, type Dispatch } from 'react';
import { gridReducer } from '@/lib/grid/grid-reducer';
import { gridOf, type GridAction, type GridSpec, type GridState } from '@/lib/grid/grid-state';

/** The state of one grid; `rows` are what it starts with. */
export function useGrid(
  spec: GridSpec,
  rows: readonly (readonly string[])[] = [],
): readonly [GridState, Dispatch<GridAction>] {
  return useReducer(
    (state: GridState, action: GridAction) => gridReducer(spec, state, action),
    undefined,
    () => gridOf(spec, rows),
  );
}
