import { signalFromText } from '../header-words';
import type { HeaderFacts } from './header-facts';
import type { TableHeading } from './header-rows';

const QUANTITY =
  /[\s:_\-/|,]*[([]?(?:absorbance|absorption|absorban[cz]e?|extin[ck]t(?:ion)?|abs\.?|mau|a\.?u\.?|o\.?d\.?|%\s?t|t\s?%|transmi(?:ttance|ssion))(?:\s*[([][^)\]]*[)\]])?[)\]]?\s*$/i;

/** Longer words over a column are a remark, not a name with its quantity. */
const LONGEST_LABEL = 200;

/** A label without the quantity it may end in: "Data Set 1:Absorbance" is the spectrum "Data Set 1". */
function withoutQuantity(label: string): string {
  if (label.length > LONGEST_LABEL) return label;
  const rest = label.replace(QUANTITY, '').trim();
  if (rest === label.trim() && signalFromText(label))
    return /^.{1,2}$/.test(rest) || /^\W*[aet]\W/i.test(rest) ? '' : rest;
  return rest;
}

/**
 * Names of the spectra in the columns given: the row above the labels, else the label without its quantity, else the
 * title above the table, the sample named in the header, or the file's name; "Series 1" is never invented.
 */
export function columnNames(
  columns: readonly number[],
  heading: TableHeading,
  facts: HeaderFacts,
  fileName: string,
  paired: boolean,
): string[] {
  const fallback = heading.title || facts.sample || fileName;
  const labels = columns.map((column) => heading.labels[column] ?? '');
  const several = columns.length > 1;
  const distinct = new Set(labels.filter((label) => label !== '')).size === columns.length;
  const bares = labels.map(withoutQuantity);
  const distinctBare = new Set(bares).size === columns.length;
  return columns.map((column, k) => {
    const above = heading.names[column] || (paired ? heading.names[column - 1] : '') || '';
    if (above !== '') return above;
    const label = labels[k] ?? '';
    const bare = bares[k] ?? '';
    if (several && distinct) return bare !== '' && distinctBare ? bare : label;
    if (bare !== '' && (bare !== label.trim() || !signalFromText(label) || several)) return bare;
    return several && label !== '' && !paired ? `${fallback} ${label}` : fallback;
  });
}
