/** Hands a text to the reader as a file, without any network. */
import type { TakeAwayFile } from './assessor.ts';

const TYPES: Readonly<Record<string, string>> = {
  json: 'application/json',
  csv: 'text/csv',
  html: 'text/html',
  md: 'text/markdown',
};

/** Offers `file` for saving under its name. */
export function download(document: Document, file: TakeAwayFile): void {
  const view = document.defaultView;
  if (view === null) return;
  const address = view.URL.createObjectURL(new view.Blob([file.text], { type: `${typeOf(file.name)};charset=utf-8` }));
  const link = document.createElement('a');
  link.href = address;
  link.download = file.name;
  document.body.append(link);
  link.click();
  link.remove();
  view.setTimeout(() => view.URL.revokeObjectURL(address), 10_000);
}

function typeOf(name: string): string {
  return TYPES[name.split('.').pop() ?? ''] ?? 'text/plain';
}
