/** A place in a text and the number that was read there. */
/** Beyond any frequency in Hz and any level; a larger number in a file is a damaged one. */
export const LARGEST_VALUE = 1e12;

export interface NumberCursor {
  text: string;
  at: number;
  value: number;
}

const POWERS = Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));
/** Digits that fit a double exactly; with a power of ten up to 22 the result is rounded right. */
const EXACT_DIGITS = 15;

/**
 * Reads an unquoted number such as "-43.19" or "+3.25e+08" at the cursor and moves past it. False
 * when there is none; what follows it is left to the caller.
 */
export function parseSimpleNumber(cursor: NumberCursor, mark: number): boolean {
  const { text } = cursor;
  const from = cursor.at;
  let at = from;
  let code = text.charCodeAt(at);
  const isNegative = code === 45;
  if (isNegative || code === 43) code = text.charCodeAt((at += 1));
  let mantissa = 0;
  let digits = 0;
  let decimals = 0;
  while (code >= 48 && code <= 57) {
    mantissa = mantissa * 10 + (code - 48);
    digits += 1;
    code = text.charCodeAt((at += 1));
  }
  let markAt = -1;
  if (code === mark) {
    markAt = at;
    code = text.charCodeAt((at += 1));
    while (code >= 48 && code <= 57) {
      mantissa = mantissa * 10 + (code - 48);
      digits += 1;
      decimals += 1;
      code = text.charCodeAt((at += 1));
    }
  }
  if (digits === 0) return false;
  let exponent = 0;
  if (code === 101 || code === 69) {
    code = text.charCodeAt((at += 1));
    const isDown = code === 45;
    if (isDown || code === 43) code = text.charCodeAt((at += 1));
    if (!(code >= 48 && code <= 57)) return false;
    while (code >= 48 && code <= 57 && exponent < 1000) {
      exponent = exponent * 10 + (code - 48);
      code = text.charCodeAt((at += 1));
    }
    if (isDown) exponent = -exponent;
  }
  const power = exponent - decimals;
  if (digits <= EXACT_DIGITS && power >= -22 && power <= 22) {
    const size = power < 0 ? mantissa / (POWERS[-power] ?? NaN) : mantissa * (POWERS[power] ?? NaN);
    cursor.value = isNegative ? -size : size;
  } else {
    const printed = text.slice(from, at);
    cursor.value = Number(markAt < 0 || mark === 46 ? printed : printed.replace(",", "."));
    if (!(Math.abs(cursor.value) <= LARGEST_VALUE)) return false;
  }
  cursor.at = at;
  return true;
}
