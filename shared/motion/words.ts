/** A number with no more digits than its size deserves: 0.64, 6.6, 36, 120. */
export function digits(value: number): string {
  const size = Math.abs(value);
  const text = size >= 10 ? value.toFixed(0) : size >= 1 ? value.toFixed(1) : value.toFixed(2);
  return text.replace(/^-(0(?:\.0+)?)$/, '$1');
}

/** "1 frame", "2.5 frames". */
export function frames(value: number): string {
  const text = Math.abs(value - Math.round(value)) < 0.05 ? Math.round(value).toString() : value.toFixed(1);
  return `${text} ${text === '1' ? 'frame' : 'frames'}`;
}

/** A share as a whole percentage: "18 %". */
export function percent(share: number): string {
  return `${Math.round(Math.abs(share) * 100)} %`;
}
