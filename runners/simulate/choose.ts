/** Which circuit simulator there is: the system's own where it is on the PATH, else the packaged one. */
import { nativePath, nativeSimulator } from './native.ts';
import { packagedSimulator } from './packaged.ts';
import type { Simulator } from './run.ts';

/** The simulator to use; undefined where there is none. `kind` asks for one of them. */
export async function chooseSimulator(kind?: 'native' | 'packaged'): Promise<Simulator | undefined> {
  const path = kind === 'packaged' ? undefined : nativePath();
  if (path !== undefined) return nativeSimulator(path);
  return kind === 'native' ? undefined : packagedSimulator();
}
