/** What the settings page asks of the tablet beyond the standing capabilities. */
export { checkOffline, type OfflineHindrance } from '../device/secure-context.ts';
export { readTheme, setTheme, themes, type Theme } from '../device/theme.ts';

/** Room left in words: "3.2 GB". */
export function bytesText(bytes: number): string {
  const units = ['kB', 'MB', 'GB', 'TB'];
  let value = bytes / 1000;
  let unit = 0;
  while (value >= 1000 && unit < units.length - 1) {
    value /= 1000;
    unit += 1;
  }
  return `${value < 10 ? value.toFixed(1) : Math.floor(value)} ${units[unit] ?? ''}`;
}
