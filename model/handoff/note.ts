/** The design note: what was asked, what was chosen and why, what it beat, where the watts go, margins, risks, cautions. */
import type { Assessment, LimitFigure } from '../assessment.ts';
import type { FrontDesign } from '../front-file.ts';
import {
  bestGainOf,
  gainOf,
  howPriced,
  isTelling,
  type Miss,
  type PricedFront,
  type Relaxations,
  type RequirementPrice,
  requirementPrices,
} from '../prices.ts';
import type { RailProblem } from '../problem.ts';
import { formatDifference, formatQuantity } from '../quantity/index.ts';
import type { Rail } from '../rail/rail.ts';
import { MODEL_VERSION } from '../version.ts';
import { hottest, type SpecHashes } from '../write-spec.ts';
import type { Document, Section } from './document.ts';
import { loopAt } from './loop.ts';
import { fullLoad, solveAt } from './solved-point.ts';

/** What a run adds to a handoff: its front, near misses and hashes. Same context, same bytes. */
export interface HandoffContext {
  readonly designs?: readonly FrontDesign[];
  readonly nearMisses?: readonly Miss[];
  readonly relaxations?: Relaxations;
  readonly hashes?: SpecHashes;
  /** How a person says names; as they stand in files where absent. */
  readonly words?: NoteWords;
}

/** Words for the names that stand in files. */
export interface NoteWords {
  /** Of a limit. */
  limit(name: string): string;
  /** Of a part's place, an effect, an objective, a value. */
  name(name: string): string;
}

const AS_THEY_STAND: NoteWords = { limit: (name) => name, name: (name) => name };

/** Alternatives, losses, limits and prices that are listed. */
const ALTERNATIVES = 5;
const LOSSES = 10;
const LIMITS = 10;
const PRICES = 6;
/** Slack under which a limit counts as a risk. */
const TIGHT = 0.1;

/** The note on the design of snapped `genes`. */
export function designNote(problem: RailProblem, genes: Float64Array, context: HandoffContext = {}): Document {
  const assessment = problem.assess(genes);
  const { rail } = problem;
  const words = context.words ?? AS_THEY_STAND;
  return {
    title: `Design note: ${rail.name}, ${assessment.id}`,
    subtitle: `${assessment.family}; chopfront ${MODEL_VERSION}${hashText(context)}.`,
    sections: [
      requirement(rail),
      choice(problem, genes, assessment, words),
      alternatives(problem, assessment, context),
      losses(assessment, words),
      margins(problem, assessment, words),
      ...prices(problem, context, words),
      risks(problem, assessment, words),
      { title: 'Cautions', list: assessment.cautions },
    ],
  };
}

function hashText({ hashes }: HandoffContext): string {
  return hashes === undefined ? '' : `; sheet ${hashes.rail.slice(0, 12)}, parts ${hashes.parts.slice(0, 12)}`;
}

function requirement(rail: Rail): Section {
  const { input, output, step } = rail;
  const volts = (value: number): string => formatQuantity(value, 'V');
  const range = (r: Rail['input'] | Rail['output']): string =>
    r.minimum === r.maximum
      ? volts(r.nominal)
      : `${volts(r.minimum)} to ${volts(r.maximum)}, usually ${volts(r.nominal)}`;
  const rows = [
    ['input', range(input)],
    ['output', `${range(output)}, ${formatQuantity(output.current, 'A')}`],
    ['output ripple at most', volts(output.ripple)],
    ...(input.ripple === undefined ? [] : [['input ripple at most', volts(input.ripple)]]),
    ...(step === undefined
      ? []
      : [
          [
            'load step',
            `${formatQuantity(step.current, 'A')} at ${formatQuantity(step.slew, 'A/s')}, within ${volts(step.deviation)}`,
          ],
        ]),
    ['ambient, air', `${formatQuantity(rail.ambient, 'K')}, ${rail.airSpeed} m/s`],
    [
      'load profile',
      rail.profile.map(({ fraction, share }) => `${percent(fraction)} load ${percent(share)} of the time`).join('; '),
    ],
    ['quantity', `${rail.quantity} pieces`],
  ];
  return { title: 'Requirement', table: { head: ['what', 'asked'], rows } };
}

function choice(problem: RailProblem, genes: Float64Array, assessment: Assessment, words: NoteWords): Section {
  const units: Readonly<Record<string, string>> = { frequency: 'Hz', inductance: 'H' };
  const rows = [
    ...assessment.objectives.map(({ name, unit, value }) => [words.name(name), formatQuantity(value, unit)]),
    ...Object.entries(assessment.design.genes)
      .filter(([name]) => name in units || name === 'phases')
      .map(([name, value]) => [words.name(name), formatQuantity(value, units[name] ?? '')]),
    ...assessment.parts.map(({ slot, name, count }) => [words.name(slot), `${count} × ${name}`]),
    ...loopRows(problem, genes),
  ];
  const broken = assessment.limits
    .filter(({ violation }) => violation > 0)
    .map(({ name, unit, value, allowed }) => {
      return `${words.limit(name)} (${formatQuantity(value, unit)} where ${formatQuantity(allowed, unit)} is allowed)`;
    });
  const verdict =
    broken.length === 0
      ? 'It keeps every limit of the sheet.'
      : `It does NOT keep every limit of the sheet; it breaks: ${broken.join(', ')}.`;
  return { title: 'Choice', paragraphs: [verdict], table: { head: ['what', 'value'], rows } };
}

function loopRows(problem: RailProblem, genes: Float64Array): string[][] {
  const loop = loopAt(solveAt(problem, genes, fullLoad(problem.rail)));
  if (!Number.isFinite(loop.crossover)) return [];
  const degrees = ((180 / Math.PI) * loop.phaseMargin).toFixed(0);
  return [['control loop, type III', `crossover ${formatQuantity(loop.crossover, 'Hz')}, phase margin ${degrees}°`]];
}

function alternatives(problem: RailProblem, assessment: Assessment, context: HandoffContext): Section {
  const words = context.words ?? AS_THEY_STAND;
  const mine = assessment.objectives.map(({ value }) => value);
  const others = (context.designs ?? []).filter(({ id }) => id !== assessment.id);
  if (others.length === 0) return { title: 'Alternatives', paragraphs: ['No run was at hand to compare with.'] };
  const chosen = nearest(problem, mine, others).slice(0, ALTERNATIVES);
  const rows = chosen.map(({ id, family, objectives }) => [
    id,
    family,
    ...objectives.map((value, k) => `${formatQuantity(value, problem.objectives[k].unit)} (${change(value, mine[k])})`),
  ]);
  return {
    title: 'Alternatives',
    paragraphs: [
      `Of ${others.length} other designs on the front none is better in every objective. The best of each objective, then the nearest, against this design:`,
    ],
    table: { head: ['design', 'family', ...problem.objectives.map(({ name }) => words.name(name))], rows },
  };
}

/** The best of each objective, then the nearest by the objectives' own scale. */
function nearest(problem: RailProblem, mine: readonly number[], others: readonly FrontDesign[]): FrontDesign[] {
  const scale = problem.objectives.map(({ ideal, reference }) => reference - ideal);
  const distance = ({ objectives }: FrontDesign): number =>
    objectives.reduce((sum, value, k) => sum + Math.abs(value - mine[k]) / scale[k], 0);
  const sorted = [...others].sort((a, b) => distance(a) - distance(b) || (a.id < b.id ? -1 : 1));
  const best = problem.objectives.map((_, k) =>
    sorted.reduce((low, design) => (design.objectives[k] < low.objectives[k] ? design : low)),
  );
  return [...new Set([...best, ...sorted])];
}

function losses(assessment: Assessment, words: NoteWords): Section {
  const sorted = [...assessment.losses].sort((a, b) => b.watts - a.watts);
  const total = sorted.reduce((sum, { watts }) => sum + watts, 0);
  const shown = sorted.slice(0, LOSSES);
  const rest = sorted.slice(LOSSES).reduce((sum, { watts }) => sum + watts, 0);
  const row = (part: string, effect: string, watts: number): string[] => [
    part,
    effect,
    formatQuantity(watts, 'W'),
    percent(watts / total),
  ];
  const rows = [
    ...shown.map(({ part, effect, watts }) => row(words.name(part), words.name(effect), watts)),
    ...(rest > 0 ? [row('all others', '', rest)] : []),
    row('together', '', total),
  ];
  return {
    title: 'Losses',
    paragraphs: ['Mean over the load profile at nominal input.'],
    table: { head: ['part', 'effect', 'loss', 'share'], rows },
  };
}

function margins(problem: RailProblem, assessment: Assessment, words: NoteWords): Section {
  const sorted = worrying(problem, assessment)
    .sort((a, b) => a.slack - b.slack)
    .slice(0, LIMITS);
  return {
    title: 'Margins',
    paragraphs: ['The tightest limits, each at its worst corner of line, load, ambient and tolerance.'],
    table: {
      head: ['limit', 'has', 'allowed', 'margin', 'corner'],
      rows: sorted.map((limit) => marginRow(limit, words)),
    },
  };
}

/** Limits but those that count whole things and are met: they leave no margin, and that is no worry. */
function worrying(problem: RailProblem, { limits }: Assessment): LimitFigure[] {
  const whole = new Set(problem.limitDefinitions.flatMap((one) => (one.whole === true ? [one.name] : [])));
  return limits.filter(({ name, violation }) => violation > 0 || !whole.has(name));
}

function marginRow({ name, unit, value, allowed, margin, corner }: LimitFigure, words: NoteWords): string[] {
  const where =
    corner === undefined ? '' : `${formatQuantity(corner.inputVoltage, 'V')} in, load ${percent(corner.load)}`;
  const figures = [formatQuantity(value, unit), formatQuantity(allowed, unit), formatDifference(margin, unit)];
  return [words.limit(name), ...figures, where];
}

function prices(problem: RailProblem, context: HandoffContext, words: NoteWords): Section[] {
  const front: PricedFront = {
    objectives: problem.objectives,
    limits: problem.limitDefinitions,
    designs: context.designs ?? [],
  };
  const { nearMisses = [], relaxations } = context;
  const lines = requirementPrices(front, nearMisses, relaxations).slice(0, PRICES);
  if (lines.length === 0) return [];
  const objectives = problem.objectives.map(({ name }) => `best ${words.name(name)}`);
  return [
    {
      title: 'What requirements cost',
      paragraphs: [
        'If one limit were relaxed so far: the best of each objective, and the design that would gain most at no more of the others.',
        howPriced(relaxations),
      ],
      table: {
        head: ['limit', 'relaxed', ...objectives, 'at no more of the others'],
        rows: lines.map((line) => priceRow(line, words)),
      },
    },
  ];
}

function priceRow(line: RequirementPrice, words: NoteWords): string[] {
  const { limit, unit, allowed, relaxedTo, design, gains } = line;
  const bests = gains.map((gain) =>
    isTelling(bestGainOf(gain)) ? `${percent(bestGainOf(gain))} less, ${formatQuantity(gain.relaxed, gain.unit)}` : '',
  );
  const top = gains.reduce((a, b) => (gainOf(b) > gainOf(a) ? b : a));
  const most = isTelling(gainOf(top))
    ? `${words.name(top.objective)} ${percent(gainOf(top))} less, ${formatQuantity(top.to, top.unit)} (${design})`
    : '';
  return [words.limit(limit), `${formatQuantity(allowed, unit)} to ${formatQuantity(relaxedTo, unit)}`, ...bests, most];
}

function risks(problem: RailProblem, assessment: Assessment, words: NoteWords): Section {
  const close = worrying(problem, assessment).filter(({ slack }) => slack < TIGHT);
  const tight = close.map(({ name }) => words.limit(name));
  const hot = Object.entries(hottest(assessment.points)).sort((a, b) => b[1] - a[1])[0];
  const list = [
    tight.length === 0
      ? 'No limit is closer than 10 % of what is allowed.'
      : `Closer than 10 % of what is allowed: ${tight.join(', ')}.`,
    ...(hot === undefined ? [] : [`Hottest in the worst case: ${words.name(hot[0])}, ${formatQuantity(hot[1], 'K')}.`]),
    'Model against hardware, published experience: efficiency within 0.2 to 0.3 points, volume within 20 %, core loss within 16 % at the 95th percentile.',
    'A circuit simulation of stage.cir proves waveforms, conduction and ripple; it cannot prove switching or core loss.',
  ];
  return { title: 'Risks', list };
}

function percent(value: number): string {
  return `${Number((100 * value).toPrecision(3))} %`;
}

function change(value: number, against: number): string {
  if (against === 0) return '';
  const share = value / against - 1;
  return `${share < 0 ? '−' : '+'}${percent(Math.abs(share))}`;
}
