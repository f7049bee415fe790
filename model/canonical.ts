/** Data as canonical JSON: keys sorted, no spaces, nothing undefined, so that equal data give equal text. */

/** Canonical JSON of plain data with finite numbers. */
export function canonicalText(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) => (isMap(inner) ? sorted(inner) : inner)) ?? 'null';
}

function isMap(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function sorted(map: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(
    Object.keys(map)
      .sort()
      .map((key) => [key, map[key]]),
  );
}
