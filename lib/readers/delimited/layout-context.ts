import type { TextLines } from '../text-lines';
import type { ReadOptions } from '../types';
import type { Dialect } from './candidates';
import type { ColumnFacts } from './column-facts';
import type { HeaderFacts } from './header-facts';
import type { TableHeading } from './header-rows';
import type { MergedBlock } from './merge-blocks';
import type { NumberTable } from './number-table';

/** All that is known of one table when its layout is decided. */
export interface LayoutContext {
  readonly lines: TextLines;
  readonly dialect: Dialect;
  readonly block: MergedBlock;
  readonly table: NumberTable;
  readonly heading: TableHeading;
  readonly columns: readonly ColumnFacts[];
  readonly header: HeaderFacts;
  readonly options: ReadOptions;
  readonly fileName: string;
  /** The last line before this table that belongs to another one; −1 when there is none. */
  readonly above: number;
}
