/** Checkpoints: what is written reads back; any damage is found; the one before is used, with a warning. */
import { mkdtempSync, readFileSync, truncateSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkpointNames, readCheckpoint, writeCheckpoint } from '../../runners/run-folder/checkpoint.ts';
import { seal, unseal } from '../../runners/run-folder/sealed.ts';

const folder = (): string => mkdtempSync(join(tmpdir(), 'chopfront-'));
const checkpoint = (number: number) => ({
  number,
  node: 'v20.0.0',
  state: { seconds: 1.5, rings: [number] },
  islands: [Uint8Array.of(1, 2, 3), new Uint8Array(0), Uint8Array.of(number)],
});

function writeThree(): string {
  const at = folder();
  for (const number of [1, 2, 3]) writeCheckpoint(at, checkpoint(number));
  return at;
}

describe('a sealed file', () => {
  it('reads back what was sealed, for any parts', () => {
    const parts = fc.array(fc.uint8Array({ maxLength: 50 }), { maxLength: 5 });
    fc.assert(
      fc.property(fc.jsonValue(), parts, (header, some) => {
        const back = unseal('test 1', seal('test 1', { header, parts: some }));
        expect(back.header).toEqual(JSON.parse(JSON.stringify(header)));
        expect(back.parts).toEqual(some);
      }),
    );
  });

  it('is refused when any one bit is flipped', () => {
    const bytes = seal('test 1', { header: { a: 1 }, parts: [Uint8Array.of(9, 8, 7)] });
    for (let bit = 0; bit < 8 * bytes.length; bit++) {
      const damaged = Uint8Array.from(bytes);
      damaged[bit >> 3] = (damaged[bit >> 3] ?? 0) ^ (1 << (bit & 7));
      expect(() => unseal('test 1', damaged)).toThrow('its checksum does not fit');
    }
  });

  it('is refused when cut short anywhere, or of another kind', () => {
    const bytes = seal('test 1', { header: {}, parts: [Uint8Array.of(1)] });
    for (let length = 0; length < bytes.length; length++) {
      expect(() => unseal('test 1', bytes.subarray(0, length))).toThrow(/cut short|checksum/);
    }
    expect(() => unseal('other', bytes)).toThrow('not a other');
  });
});

describe('the checkpoints of a folder', () => {
  it('are the last two, and the newest is read', () => {
    const at = writeThree();
    expect(checkpointNames(at)).toEqual(['checkpoint-0000000003.bin', 'checkpoint-0000000002.bin']);
    expect(readCheckpoint(at)).toEqual({ checkpoint: checkpoint(3), warnings: [] });
  });

  it('fall back to the one before when the newest is cut short', () => {
    const at = writeThree();
    truncateSync(join(at, 'checkpoint-0000000003.bin'), 40);
    const { checkpoint: found, warnings } = readCheckpoint(at);
    expect(found).toEqual(checkpoint(2));
    expect(warnings).toHaveLength(1);
    expect(warnings[0]).toMatch(/checkpoint-0000000003\.bin: damaged \(.*\); going back to the one before/);
  });

  it('fall back to the one before when a bit of the newest is flipped', () => {
    const at = writeThree();
    const path = join(at, 'checkpoint-0000000003.bin');
    const bytes = readFileSync(path);
    bytes[60] = (bytes[60] ?? 0) ^ 4;
    writeFileSync(path, bytes);
    expect(readCheckpoint(at).checkpoint).toEqual(checkpoint(2));
  });

  it('give nothing, with two warnings, when both are damaged', () => {
    const at = writeThree();
    for (const name of checkpointNames(at)) truncateSync(join(at, name), 10);
    const { checkpoint: found, warnings } = readCheckpoint(at);
    expect(found).toBeUndefined();
    expect(warnings).toHaveLength(2);
  });
});
