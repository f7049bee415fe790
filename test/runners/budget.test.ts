/** When a sweep ends, and the record of how its front grew. */
import { describe, expect, it } from 'vitest';
import { shareUsed } from '../../runners/sweep/budget.ts';
import { addRow, HISTORY_ROWS, isDue, lastGain, newHistory, tellsIslands } from '../../runners/sweep/history.ts';

const row = (epoch: number, hypervolume: number) => ({
  epoch,
  evaluations: 100 * epoch,
  feasible: 1,
  frontSize: 1,
  hypervolume,
  islands: [],
});

describe('a budget', () => {
  const history = newHistory();
  it('is used as far as its most used part; shards divide the evaluations', () => {
    expect(shareUsed({ evaluations: 1000 }, 1, { evaluations: 250, seconds: 9, history })).toBe(0.25);
    expect(shareUsed({ evaluations: 1000 }, 4, { evaluations: 250, seconds: 9, history })).toBe(1);
    expect(shareUsed({ evaluations: 1000, seconds: 10 }, 1, { evaluations: 250, seconds: 9, history })).toBe(0.9);
    expect(shareUsed({}, 1, { evaluations: 250, seconds: 9, history })).toBe(0);
  });

  it('ends a sweep whose last tenth gained less than the share asked for', () => {
    const grown = newHistory();
    for (let epoch = 1; epoch <= 100; epoch++) addRow(grown, row(epoch, epoch < 85 ? epoch / 100 : 0.85));
    expect(lastGain(grown)).toBe(0);
    expect(shareUsed({ steady: 0.001 }, 1, { evaluations: 1, seconds: 1, history: grown })).toBe(1);
    addRow(grown, row(101, 0.9));
    expect(lastGain(grown)).toBeCloseTo(0.05 / 0.9, 10);
    expect(shareUsed({ steady: 0.001 }, 1, { evaluations: 1, seconds: 1, history: grown })).toBeLessThan(0.02);
  });

  it('to be steady is used the more, the nearer the gain comes to the share asked for, and whole only below it', () => {
    const grown = newHistory();
    for (let epoch = 1; epoch <= 100; epoch++) addRow(grown, row(epoch, epoch / 100));
    // A tenth was gained over the last tenth.
    const used = (steady: number): number => shareUsed({ steady }, 1, { evaluations: 1, seconds: 1, history: grown });
    expect(used(0.05)).toBeCloseTo(0.5, 2);
    expect(used(0.01)).toBeCloseTo(0.1, 3);
    expect(used(0.0999)).toBeLessThan(1);
    expect(used(0.101)).toBe(1);
  });
});

describe('the history', () => {
  it('stays bounded and even however long the sweep, the same whether or not it was interrupted', () => {
    const history = newHistory();
    for (let epoch = 1; epoch <= 10_000; epoch++) if (isDue(history, epoch)) addRow(history, row(epoch, 1));
    expect(history.rows.length).toBeLessThanOrEqual(HISTORY_ROWS);
    expect(history.rows.length).toBeGreaterThan(HISTORY_ROWS / 4);
    expect(new Set(history.rows.map((one) => one.epoch % history.stride))).toEqual(new Set([0]));
    const gone = JSON.parse(JSON.stringify(history));
    for (let epoch = 10_001; epoch <= 12_000; epoch++) {
      for (const one of [history, gone]) if (isDue(one, epoch)) addRow(one, row(epoch, 1));
    }
    expect(gone).toEqual(history);
  });

  it('tells the islands apart in each of the first 64 epochs, then 32 times in each doubling, in rows that stay', () => {
    const told = Array.from({ length: 1024 }, (_, i) => i + 1).filter(tellsIslands);
    const between = (low: number, high: number): number => told.filter((epoch) => epoch > low && epoch <= high).length;
    expect([between(0, 64), between(64, 128), between(128, 256), between(512, 1024)]).toEqual([64, 32, 32, 32]);
    const history = newHistory();
    for (let epoch = 1; epoch <= 20_000; epoch++) {
      if (isDue(history, epoch)) addRow(history, { ...row(epoch, 1), islands: tellsIslands(epoch) ? [1] : [] });
    }
    const late = history.rows.filter((one) => one.epoch > 10_000 && one.islands.length > 0);
    expect(late.length).toBeGreaterThanOrEqual(16);
  });
});
