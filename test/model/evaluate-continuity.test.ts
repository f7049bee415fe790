/**
 * No mode boundary makes a jump: along random lines through load, voltages and resistance, loss, duty and ripple change the
 * less the shorter the step. A search parks on any jump.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { PointReport } from '../../model/assessment.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { anyCase, type Case } from './real-parts.ts';
import { type HandMade, pointOf, type Where } from './support.ts';

/** Steps along a line before the one with the largest change is looked at closely, and how often that is halved. */
const STEPS = 24;
const HALVINGS = 34;
/** Halvings between the two looks at a difference that must have shrunk from the first to the second. */
const APART = 17;

const FORCED = ['loss', 'duty', 'ripple current', 'output ripple', 'input ripple'];
const BLOCKED = ['loss', 'duty of the controlled switch', 'ripple current', 'output ripple', 'input ripple'];
const FIGURES: Readonly<Record<string, (point: PointReport) => number>> = {
  loss: (point) => point.loss,
  // In reverse the controlled switch is the low one: through zero, what must not jump is the share of the high one.
  duty: (point) => (point.mode === 'reverse' ? 1 - point.dutyCycle : point.dutyCycle),
  'duty of the controlled switch': (point) => point.dutyCycle,
  'ripple current': (point) => point.rippleCurrent,
  'output ripple': (point) => point.outputRipple,
  'input ripple': (point) => point.inputRipple,
};

/** A place `share` of the way from one to the other. */
function between(a: Where, b: Where, share: number): Where {
  const mix = (x: number, y: number): number => x + (y - x) * share;
  return {
    input: mix(a.input, b.input),
    output: mix(a.output, b.output),
    current: a.current,
    load: mix(a.load ?? 1, b.load ?? 1),
  };
}

/**
 * What is left of the figure's largest step along the line after `HALVINGS` halvings, over its largest value, and the same
 * `APART` halvings earlier.
 */
function jump(at: (share: number) => number): { jump: number; earlier: number; share: number } {
  const values = Array.from({ length: STEPS + 1 }, (_, i) => at(i / STEPS));
  const size = Math.max(...values.map(Math.abs), 1e-12);
  let low = 0;
  for (let i = 0; i < STEPS; i++) {
    if (Math.abs(values[i + 1] - values[i]) > Math.abs(values[low + 1] - values[low])) low = i;
  }
  let [a, b] = [low / STEPS, (low + 1) / STEPS];
  let [fa, fb] = [values[low], values[low + 1]];
  let earlier = 0;
  for (let halving = 0; halving < HALVINGS; halving++) {
    if (halving === HALVINGS - APART) earlier = Math.abs(fb - fa) / size;
    const middle = 0.5 * (a + b);
    const fm = at(middle);
    if (Math.abs(fm - fa) > Math.abs(fb - fm)) [b, fb] = [middle, fm];
    else [a, fa] = [middle, fm];
  }
  return { jump: Math.abs(fb - fa) / size, earlier, share: a };
}

function smooth(made: HandMade, from: Where, to: Where, over: Partial<Rail>, names = BLOCKED): void {
  const found = names.map((name) => {
    const at = (share: number): number =>
      FIGURES[name](pointOf(made, between(from, to, share), { coolingArea: 10, ...over }));
    return { name, ...jump(at) };
  });
  // A jump does not shrink at all. A figure that goes with a small power of the distance (the duty near no load: the root;
  // the output charge of a superjunction near zero current: the ninth root) shrinks slowly, but it does.
  expect(found.filter((figure) => !(figure.jump < 1e-4 || figure.jump < 0.5 * figure.earlier))).toEqual([]);
}

/** The other end of a line: the same design at another load and other voltages near by. */
function line(least: number, most: number, { where }: Case, turn: readonly number[]): Where {
  const load = least + (most - least) * turn[0];
  const input = where.input * (0.9 + 0.2 * turn[1]);
  return { input, output: Math.min(where.output * (0.9 + 0.2 * turn[2]), 0.95 * input), current: where.current, load };
}

const turn = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 3, maxLength: 3 });
const RUNS = { numRuns: 6, seed: 3, endOnFailure: true };

describe('along random lines', () => {
  it('synchronous, forced continuous: through zero current, a negative valley, into reverse', () => {
    fc.assert(
      fc.property(anyCase('buck-synchronous', -1, 1), turn, (drawn, other) =>
        smooth(drawn.made, drawn.where, line(-1, 1, drawn, other), { lightLoad: 'forced-continuous' }, FORCED),
      ),
      RUNS,
    );
  });

  it('synchronous with diode emulation: through ΔI/2 and through the shortest on-time', () => {
    fc.assert(
      fc.property(anyCase('buck-synchronous', 0.001, 1), turn, (drawn, other) =>
        smooth(drawn.made, drawn.where, line(0.001, 0.2, drawn, other), { lightLoad: 'diode-emulation' }),
      ),
      RUNS,
    );
  });

  it('synchronous with diode emulation in reverse', () => {
    fc.assert(
      fc.property(anyCase('buck-synchronous', -1, -0.001), turn, (drawn, other) =>
        smooth(drawn.made, drawn.where, line(-0.2, -0.001, drawn, other), { lightLoad: 'diode-emulation' }),
      ),
      RUNS,
    );
  });

  it('with a diode: through ΔI/2 and through the shortest on-time', () => {
    fc.assert(
      fc.property(anyCase('buck-diode', 0.001, 1), turn, (drawn, other) =>
        smooth(drawn.made, drawn.where, line(0.001, 0.2, drawn, other), {}),
      ),
      RUNS,
    );
  });

  it('through no load with diode emulation: pulses of either direction thin out to none, and loss with them', () => {
    // The size of a single pulse differs between the directions; at no load there is no pulse left to see it on, as long as
    // the controller has a shortest pulse at all.
    fc.assert(
      fc.property(anyCase('buck-synchronous', 0.001, 0.1), turn, (drawn, other) => {
        const controller = { ...drawn.made.controller, minimumOnTime: 0.1 / drawn.made.frequency };
        const made = { ...drawn.made, controller };
        smooth(made, drawn.where, line(-0.1, -0.001, drawn, other), { lightLoad: 'diode-emulation' }, ['loss']);
      }),
      RUNS,
    );
  });
});
