/**
 * The limits of a rail and how far each is kept by the design at hand: one number a limit, the worst over all points.
 * The search reads violations from here, the assessment reads margins and corners: the same numbers.
 */

/** A limit that the rail, the parts or physics set. */
export interface LimitDefinition {
  readonly name: string;
  readonly unit: string;
  /** Whether the value must stay below or above what is allowed. */
  readonly sense: 'most' | 'least';
  /** Whether it counts whole things, abilities or rating classes: met exactly, it leaves no margin, and that is no worry. */
  readonly whole?: boolean;
}

/** Limits of one rail with the worst figures of one design. Reused from design to design. */
export class LimitBook {
  readonly definitions: readonly LimitDefinition[];
  readonly value: Float64Array;
  readonly allowed: Float64Array;
  /** (allowed − value)/scale, or its twin for a least value; ≥ 0 holds. +∞ while unjudged, NaN where not computable. */
  readonly slack: Float64Array;
  /** Index of the judged point where the slack was smallest; −1 where no point matters. */
  readonly corner: Int32Array;
  private readonly sign: Float64Array;
  /** The judgement at hand: what was found and what is allowed, in the limit's unit, and what turns a miss into a fraction. */
  found = 0.5;
  bound = 0.5;
  scale = 0.5;
  private readonly places: Map<string, number>;

  constructor(definitions: readonly LimitDefinition[]) {
    this.definitions = definitions;
    const n = definitions.length;
    this.value = new Float64Array(n);
    this.allowed = new Float64Array(n);
    this.slack = new Float64Array(n);
    this.corner = new Int32Array(n);
    this.sign = Float64Array.from(definitions, (definition) => (definition.sense === 'most' ? 1 : -1));
    this.places = new Map(definitions.map((definition, index) => [definition.name, index]));
  }

  /** Place of the limit `name`; −1 where this rail does not have it (judging it then does nothing). */
  place(name: string): number {
    return this.places.get(name) ?? -1;
  }

  /** Forgets the last design. */
  clear(): void {
    this.slack.fill(Number.POSITIVE_INFINITY);
    this.value.fill(0);
    this.allowed.fill(0);
    this.corner.fill(-1);
  }

  /**
   * Notes one judgement: `value` against `allowed`, in the limit's unit; a miss counts as a fraction of what is allowed. Doubles are
   * handed on through fields: calls so small that the engine always inlines them carry them, and nothing is boxed.
   */
  judge(place: number, value: number, allowed: number, point: number): void {
    this.found = value;
    this.bound = allowed;
    this.weigh(place, point);
  }

  /** The same where `scale` > 0 turns the miss into a fraction. */
  judgeBy(place: number, value: number, allowed: number, scale: number, point: number): void {
    this.scale = scale;
    this.judgeByScale(place, value, allowed, point);
  }

  private judgeByScale(place: number, value: number, allowed: number, point: number): void {
    this.found = value;
    this.bound = allowed;
    this.weighByScale(place, point);
  }

  /** The same for value, allowed and scale that stand in `asked[0 … 2]`. */
  judgeAt(place: number, asked: Float64Array, point: number): void {
    this.found = asked[0];
    this.bound = asked[1];
    this.scale = asked[2];
    this.weighByScale(place, point);
  }

  /** Notes the judgement that `found` and `bound` hold, as `judge` does: for callers too large for it to be inlined there. */
  weigh(place: number, point: number): void {
    this.scale = this.bound;
    this.weighByScale(place, point);
  }

  /** The same for a `scale` of the caller's. */
  weighByScale(place: number, point: number): void {
    if (place < 0) return;
    const slack = (this.sign[place] * (this.bound - this.found)) / this.scale;
    // A figure that cannot be computed stays: no later corner may hide it.
    if (slack >= this.slack[place] || Number.isNaN(this.slack[place])) return;
    this.slack[place] = slack;
    this.value[place] = this.found;
    this.allowed[place] = this.bound;
    this.corner[place] = point;
  }

  /** Writes violations: 0 where a limit holds, else the fraction by which it is missed; NaN where not computable. */
  violations(into: Float64Array): void {
    for (let i = 0; i < this.slack.length; i++) into[i] = this.slack[i] >= 0 ? 0 : -this.slack[i];
  }
}
