/** Words for the names that data carry: `outputCeramicCount` and `output-ripple` become what a person would say. */

const SPOKEN: Readonly<Record<string, string>> = {
  loss: 'loss, profile mean',
  inefficiency: 'inefficiency, profile mean',
  'full-load-loss': 'loss at full load',
  'board-area': 'board area',
  outputCeramicCount: 'output ceramics',
  inputCeramicCount: 'input ceramics',
  outputBulkCount: 'output bulks',
  inputBulkCount: 'input bulks',
  windingAc: 'winding, ac',
};

/** Lower-case words of a camel-case or hyphenated name; digits and units stay as they are. */
export function spoken(name: string): string {
  const known = SPOKEN[name];
  if (known !== undefined) return known;
  return name
    .replace(/([a-z0-9])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`)
    .replace(/@(\d+)%/g, ' at $1\u00a0% load')
    .replace(/[-_]+/g, ' ');
}

/** The same with a capital first letter. */
export function titled(name: string): string {
  const words = spoken(name);
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** `items` as a phrase: `a`, `a and b`, `a, b and c`. */
export function listed(items: readonly string[]): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;
}

/** `count` with its noun, singular or plural, thousands apart: `1 design`, `2,041 designs`. */
export function counted(count: number, noun: string): string {
  return `${thousands(count)} ${noun}${count === 1 ? '' : 's'}`;
}

/** A whole number with its thousands apart. */
export function thousands(count: number): string {
  return String(Math.round(count)).replace(/\B(?=(\d{3})+(?!\d))/g, '\u202f');
}
