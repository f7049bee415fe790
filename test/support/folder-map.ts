/** The README's folder map, read as the rule that it is: `folder | may import | may use`. */

export interface Room {
  /** Folder with its closing `/`. */
  readonly folder: string;
  /** Other folders (closing `/`) and files it may import. */
  readonly mayImport: readonly string[];
  /** Packages and Node's own modules it may use, by name. */
  readonly packages: readonly string[];
  /** What of the platform it may use. */
  readonly platform: readonly Platform[];
}

/** Words of the map's last column that are not package names. */
const PLATFORM = ['the DOM', 'the clock', 'Node', 'any development dependency'] as const;
export type Platform = (typeof PLATFORM)[number];

/** The map's rows; throws where the text has no such table or a row cannot be understood. */
export function readFolderMap(markdown: string): readonly Room[] {
  const lines = markdown.split('\n');
  const head = lines.findIndex((line) => /^\|\s*folder\s*\|\s*may import\s*\|\s*may use\s*\|/.test(line));
  if (head < 0) throw new Error('no table `folder | may import | may use`');
  const end = lines.findIndex((line, index) => index > head && !line.startsWith('|'));
  return lines.slice(head + 2, end < 0 ? undefined : end).map(readRow);
}

function readRow(line: string): Room {
  const [folders = '', mayImport = '', mayUse = ''] = line.split('|').slice(1, -1);
  const [folder] = ticked(folders);
  if (!folder?.endsWith('/')) throw new Error(`no folder in this row of the folder map: ${line}`);
  const platform = PLATFORM.filter((words) => mayUse.includes(words));
  const left = [...PLATFORM, ...ticked(mayUse).map((name) => `\`${name}\``)].reduce(
    (text, known) => text.replace(known, ''),
    mayUse,
  );
  if (/\w/.test(left)) throw new Error(`not understood in the folder map: ${left.trim()}`);
  return { folder, mayImport: ticked(mayImport), packages: ticked(mayUse), platform };
}

function ticked(cell: string): readonly string[] {
  return [...cell.matchAll(/`([^`]+)`/g)].map(([, name = '']) => name);
}
