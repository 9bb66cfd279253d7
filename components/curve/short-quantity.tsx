import { formatDecimals, withTrueMinus } from '@/lib/format/number';
import { formatShort, type ShortQuantity as Short } from '@/lib/format/quantity';
import { decimalsFor, shortDigits, toDecimals } from '@/lib/format/round';

const MOST_DECIMALS = 7;

/** The same without a power of ten, for a number that stands in a sum with others: 0.0007(8). */
function inPlaces(value: number, u: number): Short {
  const decimals = u > 0 ? decimalsFor(u, shortDigits(u)) : 0;
  if (decimals < 1 || decimals > MOST_DECIMALS) return formatShort(value, u);
  const mantissa = formatDecimals(value, decimals);
  const bracket = toDecimals(u, decimals)
    .replace(/^[0.]+/, '')
    .replace('.', '');
  return { mantissa, bracket, exponent: null, text: `${mantissa}(${bracket})` };
}

/** A value with its standard uncertainty in brackets: 0.1981(7), 1.111(4) × 10⁴. */
export function ShortQuantity({ value, u, inSum = false }: { value: number; u: number; inSum?: boolean }) {
  const { mantissa, bracket, exponent } = inSum ? inPlaces(value, u) : formatShort(value, u);
  return (
    <span className="num whitespace-nowrap">
      {mantissa}
      {bracket !== '' && <span className="aside">({bracket})</span>}
      {exponent !== null && (
        <>
          {' × 10'}
          <sup>{withTrueMinus(String(exponent))}</sup>
        </>
      )}
    </span>
  );
}
