/** WCAG 2.2, "general flash": a change of 10 % or more of the greatest relative luminance … */
const FLASH_CHANGE = 0.1;
/** … where the darker picture lies below this relative luminance. */
const FLASH_DARK = 0.8;
/** WCAG 2.2, success criterion 2.3.1: no more than three flashes within any second. */
export const MOST_FLASHES = 3;

/**
 * Relative luminance of an sRGB picture, averaged over its pixels, 0 to 1 (WCAG 2.2, "relative luminance").
 * @param rgba red, green, blue, alpha for each pixel, 0 to 255
 */
export function meanLuminance(rgba: ArrayLike<number>): number {
  const pixels = Math.floor(rgba.length / 4);
  if (pixels === 0) return 0;
  const linear = (channel: number) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  };
  let sum = 0;
  for (let index = 0; index < pixels * 4; index += 4) {
    sum += 0.2126 * linear(rgba[index]!) + 0.7152 * linear(rgba[index + 1]!) + 0.0722 * linear(rgba[index + 2]!);
  }
  return sum / pixels;
}

/** Frames at which a change between turning points of the luminance completes half a flash, with its direction. */
function halfFlashes(luminances: readonly number[]): { frame: number; up: boolean }[] {
  const halves: { frame: number; up: boolean }[] = [];
  let extreme = luminances[0] ?? 0;
  let direction: 'up' | 'down' | null = null;
  luminances.forEach((here, frame) => {
    const carriesOn = direction === 'up' ? here > extreme : direction === 'down' ? here < extreme : false;
    if (carriesOn) {
      extreme = here;
      return;
    }
    if (Math.abs(here - extreme) < FLASH_CHANGE || Math.min(here, extreme) >= FLASH_DARK) return;
    direction = here > extreme ? 'up' : 'down';
    extreme = here;
    halves.push({ frame, up: direction === 'up' });
  });
  return halves;
}

/**
 * The most flashes that fall within any one second of a looped strip. A flash is a pair of opposing changes (WCAG 2.2,
 * success criterion 2.3.1); the mean of the picture stands for its area, so a small light that blinks is not counted.
 * @param luminances relative luminance of each frame, 0 to 1
 * @param fps frames a second
 */
export function flashesInASecond(luminances: readonly number[], fps: number): number {
  if (luminances.length < 2) return 0;
  const loops = Math.max(2, Math.ceil((2 * fps) / luminances.length));
  const looped = Array.from({ length: loops }, () => luminances).flat();
  const halves = halfFlashes(looped);
  let most = 0;
  let first = 0;
  for (let last = 0; last < halves.length; last++) {
    while (halves[last]!.frame - halves[first]!.frame >= fps) first++;
    most = Math.max(most, Math.floor((last - first + 1) / 2));
  }
  return most;
}
