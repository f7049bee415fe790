/** Durations as people write and read them: `8h`, `90 min`, `1h30m`, `45 s`, `2 d`. */

const SECONDS: Readonly<Record<string, number>> = { d: 86_400, h: 3600, min: 60, m: 60, s: 1 };
const ONE = /^\s*(\d+(?:\.\d+)?)\s*(d|h|min|m|s)/;

/** Seconds, above zero; undefined where `text` is not a duration. */
export function readDuration(text: string): number | undefined {
  let rest = text.trim();
  let total = 0;
  while (rest !== '') {
    const found = ONE.exec(rest);
    if (found === null) return undefined;
    total += Number(found[1]) * (SECONDS[found[2] ?? ''] ?? 0);
    rest = rest.slice(found[0].length).trim();
  }
  return total > 0 && Number.isFinite(total) ? total : undefined;
}

/** `seconds` in at most two units: `45 s`, `12 min`, `3 h 20 min`, `2 d 4 h`. */
export function showDuration(seconds: number): string {
  if (!Number.isFinite(seconds)) return '?';
  const whole = Math.max(0, Math.round(seconds));
  if (whole < 60) return `${whole} s`;
  if (whole < 3600) return pair(whole, 60, 'min', 1, 's');
  if (whole < 86_400) return pair(whole, 3600, 'h', 60, 'min');
  return pair(whole, 86_400, 'd', 3600, 'h');
}

function pair(whole: number, large: number, largeName: string, small: number, smallName: string): string {
  const rest = Math.floor((whole % large) / small);
  return rest === 0
    ? `${Math.floor(whole / large)} ${largeName}`
    : `${Math.floor(whole / large)} ${largeName} ${rest} ${smallName}`;
}
