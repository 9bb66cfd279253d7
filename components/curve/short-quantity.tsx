import { withTrueMinus } from '@/lib/format/number';
import { formatShort } from '@/lib/format/quantity';

/** A value with its standard uncertainty in brackets: 0.1981(7), 1.111(4) × 10⁴. */
export function ShortQuantity({ value, u }: { value: number; u: number }) {
  const { mantissa, bracket, exponent } = formatShort(value, u);
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
