/** An evaluation leaves nothing behind: doubles travel through records and arrays, never through calls that box them. */
import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { packagePath } from '../../runners/package-path.ts';

/** Bytes of garbage per evaluation over 10⁵, by the engine's own sampling, all code compiled beforehand. */
function garbageOf(reference: string): number {
  const task = JSON.stringify({ root: packagePath(), reference, work: 'garbage' });
  const script = packagePath('dist', 'test', 'bench', 'reference.js');
  const child = spawnSync(process.execPath, ['--no-concurrent-recompilation', script, task], { encoding: 'utf8' });
  return (JSON.parse(child.stdout) as { bytes: number }).bytes;
}

describe('Under one byte of garbage per evaluation over 10⁵', () => {
  it.each(['two-phase synchronous buck', 'half-bridge with current doubler'])('%s', (reference) => {
    expect(garbageOf(reference)).toBeLessThan(1);
  });
});
