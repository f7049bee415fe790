/** The spread: a case with a known answer, the same numbers whoever draws them, and what each tolerance is blamed for. */
import { describe, expect, it } from 'vitest';
import { drawSamples, spreadOf, summarise } from '../../../model/index.ts';
import { handMade, plainRail } from '../support.ts';

/** A switch with some charge: without any, the ringing of its loop has no size. */
const CHARGED = { high: { outputCharge: 1e-8, gateChargeSwitch: 1e-9, gateResistance: 1, voltageRating: 100 } };

/**
 * One normal tolerance and one limit: output ripple of a bank that is all resistance is R·Vo·(1 − D)/(L·f). The limit sits one
 * deviation of L below nominal: ripple/(1 + δ) ≤ limit ⇔ δ ≥ −σ, and 84.134 % of a normal lies above −σ (Abramowitz and
 * Stegun, table 26.1, from memory).
 */
function oneTolerance() {
  const where = { input: 12, output: 3, current: 10 };
  const [ohms, henries, hertz] = [10e-3, 2e-6, 400e3];
  const ripple = (ohms * 3 * (1 - 3 / 12)) / (henries * hertz);
  const sigma = 0.3 / 3;
  const rail = plainRail(where, {
    tolerances: { inductance: 0.3, capacitance: 0, oscillator: 0, onResistance: 0 },
    output: { minimum: 3, nominal: 3, maximum: 3, current: 10, ripple: ripple / (1 - sigma), battery: false },
  });
  return handMade(
    {
      frequency: hertz,
      inductor: { inductance: henries },
      ...CHARGED,
      outputCeramic: { capacitance: 1, seriesResistance: ohms },
    },
    rail,
  );
}

describe('a case with a known answer', () => {
  const { problem, genes } = oneTolerance();
  const spread = spreadOf(problem, genes, 4000, 'known');

  it('the yield lies within its binomial interval: 84.134 % for a limit one deviation away', () => {
    const all = spread.yields[0];
    expect(all?.name).toBe('all limits');
    expect(all?.low).toBeLessThan(0.84134);
    expect(all?.high).toBeGreaterThan(0.84134);
  });

  it('the limit that is missed is named, and the tolerance that misses it gets the variance', () => {
    expect(spread.yields[1]?.name).toBe('outputRipple');
    const shares = spread.variance.find(({ figure }) => figure === 'tightest limit')?.shares ?? [];
    expect(shares[0]?.cause).toBe('inductance');
    expect(shares[0]?.share).toBeGreaterThan(0.9);
  });
});

describe('chance', () => {
  const { problem, genes } = oneTolerance();

  it('the same seed gives the same samples, in one piece or in three', () => {
    const whole = drawSamples(problem, genes, 's', 0, 90);
    const pieces = [
      drawSamples(problem, genes, 's', 60, 90),
      drawSamples(problem, genes, 's', 0, 25),
      drawSamples(problem, genes, 's', 25, 60),
    ];
    const joined = Float64Array.from([...pieces[1], ...pieces[2], ...pieces[0]]);
    expect(joined).toEqual(whole);
    expect(summarise(problem, genes, joined, 's')).toEqual(spreadOf(problem, genes, 90, 's'));
  });

  it('another seed gives others', () => {
    expect(drawSamples(problem, genes, 'a', 0, 5)).not.toEqual(drawSamples(problem, genes, 'b', 0, 5));
  });

  it('without tolerances every sample is good, volume and cost are one value, and loss moves with the ambient alone', () => {
    const rail = plainRail({ input: 12, output: 3, current: 10 });
    const still = handMade({ frequency: 4e5, inductor: { inductance: 2e-6 }, ...CHARGED }, rail);
    const spread = spreadOf(still.problem, still.genes, 50, '1');
    expect(spread.yields).toHaveLength(1);
    expect(spread.yields[0]?.share).toBe(1);
    for (const { name, p5, p95 } of spread.objectives) if (name !== 'loss') expect(p5).toBe(p95);
    expect(spread.variance.map(({ figure }) => figure)).toContain('loss');
    for (const { shares } of spread.variance) expect(shares.map(({ cause }) => cause)).toEqual(['ambient']);
  });
});
