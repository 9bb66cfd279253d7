export function isNumberStart(code: number): boolean {
  return (code >= 48 && code <= 57) || code === 43 || code === 45 || code === 46;
}

export function startsToken(code: number): boolean {
  return (
    code === 63 ||
    code === 43 ||
    code === 45 ||
    squeezed(code) !== undefined ||
    differenceDigit(code) !== undefined ||
    duplicate(code) !== undefined
  );
}

/** First digit of an ordinate in SQZ form, with its sign. */
export function squeezed(code: number): number | undefined {
  if (code === 64) return 0;
  if (code >= 65 && code <= 73) return code - 64;
  if (code >= 97 && code <= 105) return 96 - code;
  return undefined;
}

/** First digit of a difference in DIF form, with its sign. */
export function differenceDigit(code: number): number | undefined {
  if (code === 37) return 0;
  if (code >= 74 && code <= 82) return code - 73;
  if (code >= 106 && code <= 114) return 105 - code;
  return undefined;
}

/** First digit of a repeat count in DUP form. */
export function duplicate(code: number): number | undefined {
  if (code >= 83 && code <= 90) return code - 82;
  return code === 115 ? 9 : undefined;
}

/** The number of a packed first digit (with its sign) and the digits that follow it. */
export function packedNumber(lead: number, text: string, from: number, to: number): number {
  const negative = lead < 0;
  let value = negative ? -lead : lead;
  for (let i = from; i < to; i++) {
    const code = text.charCodeAt(i);
    if (code < 48 || code > 57) {
      value = Number(`${Math.abs(lead)}${text.slice(from, to).replace(',', '.')}`);
      break;
    }
    value = value * 10 + (code - 48);
  }
  return negative ? -value : value;
}

/** Half a unit of the last digit of a number as written: how far it may be off by rounding. */
export function halfUnit(text: string, start: number, end: number, mark: number): number {
  let decimals = -1;
  for (let i = start; i < end; i++) {
    const code = text.charCodeAt(i);
    if (code === mark) decimals = 0;
    else if (decimals >= 0 && code >= 48 && code <= 57) decimals += 1;
    else if ((code | 32) === 101) return 0.5 * 10 ** (Number(text.slice(i + 1, end)) - Math.max(decimals, 0));
  }
  return 0.5 * 10 ** -Math.max(decimals, 0);
}
