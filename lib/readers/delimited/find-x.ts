import { isWavelengthWord, namesX, otherAxisWord, signalFromText, xUnitFromText } from '../header-words';
import { xOrder } from '../inspect/order';
import type { ReadOptions } from '../types';
import { inRange, type ColumnFacts } from './column-facts';
import type { NumberTable } from './number-table';

/** A column with at least this share of numbers can be an axis. */
const FILLED = 0.5;
/** Unnamed columns in no order are x only when there are enough rows to believe it. */
const ENOUGH = 10;

/**
 * The column that is x: the person's word, else the best of what its heading says and how its numbers run. A column
 * headed as time, concentration, temperature or a signal is never x of a spectrum.
 */
export function findX(
  table: NumberTable,
  facts: readonly ColumnFacts[],
  labels: readonly string[],
  options: ReadOptions,
): number | undefined {
  if (options.xColumn !== undefined) return options.xColumn < facts.length ? options.xColumn : undefined;
  const firstPlain = facts.findIndex((fact, i) => fact.numbers > 0 && !(fact.isIndex && hasOther(facts, i)));
  let best: number | undefined;
  let most = 0;
  facts.forEach((fact, i) => {
    const score = xScore(table, fact, labels[i] ?? '', i, firstPlain);
    if (score > most) {
      most = score;
      best = i;
    }
  });
  return best;
}

/** Whether the numbers alone chose x, and another column could be x as well. */
export function xIsGuess(
  table: NumberTable,
  facts: readonly ColumnFacts[],
  labels: readonly string[],
  options: ReadOptions,
  xColumn: number,
): boolean {
  const label = labels[xColumn] ?? '';
  if (options.xColumn !== undefined || namesX(label)) return false;
  return facts.some((fact, i) => i !== xColumn && xScore(table, fact, labels[i] ?? '', i, xColumn) > 0);
}

function hasOther(facts: readonly ColumnFacts[], index: number): boolean {
  return facts.some((fact, i) => i > index && fact.direction !== 0 && fact.numbers > 1 && inRange(fact));
}

function xScore(
  table: NumberTable,
  fact: ColumnFacts,
  label: string,
  index: number,
  firstPlain: number,
): number {
  if (fact.numbers < FILLED * fact.rows || (fact.low === fact.high && fact.rows > 1)) return 0;
  const place = 1 - index / 1000;
  const unit = xUnitFromText(label);
  const plausible = fact.direction !== 0 || fact.sorted >= 0.9 || inRange(fact, unit);
  if (!plausible && isWavelengthWord(label)) return 0;
  if (
    isWavelengthWord(label) ||
    (unit && !readAtOne(label) && label.length < 40 && !signalFromText(label.replace(/\bA\b/, '')))
  )
    return 100 + place;
  if (otherAxisWord(label) || signalFromText(label) || fact.isIndex) return 0;
  if (!inRange(fact)) return 0;
  if (index !== firstPlain)
    return fact.low >= 100 && fact.direction !== 0 && fact.rows >= ENOUGH ? 10 + place : 0;
  if (fact.direction !== 0) return 50 + place;
  if (fact.sorted >= 0.9) return 40 + place;
  const values = table.columns[index]?.values ?? new Float64Array();
  const ordered = xOrder(values).kind !== 'unsorted';
  const distinct = new Set(values).size === values.length;
  return fact.low >= 100 && (ordered || (distinct && values.length >= ENOUGH)) ? 20 + place : 0;
}

/** "A (412 nm)" is a reading at one wavelength, not an axis. */
function readAtOne(label: string): boolean {
  return /\d\s?(?:nm|\u00b5m|um)(?![a-z])/i.test(label);
}

/**
 * Whether a table is pairs of x and y side by side: x in every second column, each running one way, all over a
 * similar range. A pair without any number is no obstacle.
 */
export function isPaired(
  facts: readonly ColumnFacts[],
  labels: readonly string[],
  xColumn: number | undefined,
): boolean {
  let columns = facts.length;
  while (columns > 0 && facts[columns - 1]?.numbers === 0 && (labels[columns - 1] ?? '') === '') columns -= 1;
  if (columns < 4 || columns % 2 !== 0 || xColumn !== 0) return false;
  const [first] = facts;
  if (!first) return false;
  for (let i = 2; i < columns; i += 2) {
    const fact = facts[i];
    const label = labels[i] ?? '';
    const named = namesX(label);
    if (!fact) return false;
    if (fact.numbers === 0) {
      if (!named && (facts[i + 1]?.numbers ?? 0) > 0) return false;
      continue;
    }
    if (named) continue;
    if (fact.direction === 0 || !inRange(fact)) return false;
    const reach =
      (Math.min(fact.high, first.high) - Math.max(fact.low, first.low)) /
      (Math.min(fact.high - fact.low, first.high - first.low) || 1);
    if (!(reach > 0.3) && fact.numbers > 1) return false;
  }
  return true;
}
