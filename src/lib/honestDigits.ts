const NARROW_NO_BREAK_SPACE = '\u202f';

/**
 * Decimals a value deserves: down to the first digit of its uncertainty and no further.
 * @param halfWidth half the width of its interval, in the unit of the value; 0 or NaN: nothing is known, so `most`
 * @param most never more than this many
 */
export function decimalsFor(halfWidth: number, most = 2): number {
  if (!(halfWidth > 0)) return most;
  return Math.min(most, Math.max(0, Math.ceil(-Math.log10(halfWidth) - 1e-9)));
}

/** A number for the screen, with a real minus sign and without a minus before zero. */
export function shownNumber(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return (Number(text) === 0 ? text.replace('-', '') : text).replace('-', '−');
}

/** A share as a percentage: 0.64 is "64 %". */
export function shownPercent(share: number, decimals = 0): string {
  return `${shownNumber(share * 100, decimals)}${NARROW_NO_BREAK_SPACE}%`;
}
