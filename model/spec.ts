/**
 * The design spec: one JSON file that holds a chosen design and what was expected of it, with a published schema. Reading it
 * back gives the same design, and so the same assessment.
 */
import { z } from 'zod';
import type { DesignRecord } from './assessment.ts';
import { bad, type Finding, good, type Outcome } from './outcome.ts';
import { shorten } from './quantity/parse.ts';
import { ARCHITECTURES } from './stages/list.ts';

const figure = z.object({
  name: z.string(),
  unit: z.string().describe('SI base unit, or the currency code'),
  value: z.number(),
});

const limit = z.object({
  name: z.string(),
  unit: z.string(),
  value: z.number(),
  allowed: z.number(),
  margin: z.number().describe('Distance to what is allowed, in the unit; 0 or more holds'),
});

const point = z.object({
  inputVoltage: z.number().describe('V'),
  outputVoltage: z.number().describe('V'),
  load: z.number().describe('Load current over full load, -1 to 1'),
  share: z.number().describe('Share of the profile time'),
  mode: z.string(),
  activePhases: z.number(),
  dutyCycle: z.number(),
  frequency: z.number().describe('Effective switching frequency, Hz'),
  rippleCurrent: z.number().describe('Peak to peak in one phase, A'),
  peakCurrent: z.number().describe('A'),
  valleyCurrent: z.number().describe('A'),
  outputRipple: z.number().describe('V peak to peak'),
  inputRipple: z.number().describe('V peak to peak'),
  outputPower: z.number().describe('W'),
  loss: z.number().describe('W'),
  efficiency: z.number(),
  temperatures: z.record(z.string(), z.number()).describe('K by part'),
});

const part = z.object({
  slot: z.string(),
  name: z.string(),
  count: z.number(),
  cost: z.number().describe('All pieces, in the currency of the rail'),
});

const waveform = z.object({
  name: z.string(),
  unit: z.string(),
  mean: z.number(),
  rms: z.number(),
  peak: z.number(),
  valley: z.number(),
});

const compensator = z.object({
  form: z.literal('type-III').describe('R1 with R3-C3 beside it, R2-C1 with C2 beside it in feedback; ramp of 1 V'),
  crossover: z.number().describe('Hz'),
  phaseMargin: z.number().describe('degrees'),
  r1: z.number().describe('ohm; chosen'),
  r2: z.number().describe('ohm'),
  r3: z.number().describe('ohm'),
  c1: z.number().describe('F'),
  c2: z.number().describe('F'),
  c3: z.number().describe('F'),
});

const specShape = z.object({
  format: z.literal('chopfront-spec'),
  version: z.literal(1),
  tool: z.string().describe('Version of the tool that wrote the file'),
  id: z.string().describe('Hash of genes and part names'),
  rail: z.string().describe('Name of the rail'),
  architecture: z.enum(ARCHITECTURES),
  genes: z.record(z.string(), z.number()).describe('Every chosen number by name, SI base units'),
  parts: z.record(z.string(), z.string()).describe('Every chosen part by slot'),
  partsList: z.array(part).optional(),
  feasible: z.boolean().optional(),
  objectives: z.array(figure).optional(),
  limits: z.array(limit).optional(),
  points: z.array(point).optional().describe('Operating points of the load profile at nominal input'),
  losses: z
    .array(z.object({ part: z.string(), effect: z.string(), watts: z.number() }))
    .optional()
    .describe('Profile-weighted'),
  requirement: z.record(z.string(), z.number()).optional().describe('What the sheet asks for, by name, SI base units'),
  waveforms: z.array(waveform).optional().describe('Currents of one phase at full load, nominal input, usual values'),
  compensator: compensator.optional(),
  temperatures: z.record(z.string(), z.number()).optional().describe('K by part, the hottest over all judged points'),
  hashes: z
    .object({ rail: z.string(), parts: z.string() })
    .optional()
    .describe('Of sheet and parts tables in canonical form'),
  tolerances: z.record(z.string(), z.number()).optional().describe('Fractions assumed in the worst case'),
  cautions: z.array(z.string()).optional(),
});

/** A spec as data. */
export type Spec = z.infer<typeof specShape>;

/** JSON Schema (draft 2020-12) of a spec. */
export const SPEC_SCHEMA: Readonly<Record<string, unknown>> = z.toJSONSchema(specShape);

/** Reads a spec; every problem of shape is a finding in `file`. */
export function readSpec(text: string, file: string): Outcome<Spec> {
  let data: unknown;
  try {
    data = JSON.parse(text);
  } catch (error) {
    const reason = error instanceof Error ? shorten(error.message) : 'unreadable';
    const allowed = 'a design in spec form, as JSON, such as chopfront handoff writes';
    return bad([{ file, line: 0, column: 0, field: '', found: `no JSON (${reason})`, allowed }]);
  }
  const parsed = specShape.safeParse(data);
  if (parsed.success) return good(parsed.data);
  return bad(
    parsed.error.issues.slice(0, 50).map(
      (issue): Finding => ({
        file,
        line: 0,
        column: 0,
        field: issue.path.join('.'),
        found: foundAt(data, issue.path),
        allowed: allowedBy(issue),
      }),
    ),
  );
}

/** The design that a spec holds. */
export function recordOfSpec(spec: Spec): DesignRecord {
  return { architecture: spec.architecture, genes: spec.genes, parts: spec.parts };
}

const SHAPES: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  boolean: 'true or false',
  array: 'a list',
  object: 'a map',
  record: 'a map',
};

/** What may stand where zod complains, in our own words. */
function allowedBy(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_type') return SHAPES[issue.expected] ?? issue.expected;
  return issue.code === 'invalid_value' ? issue.values.map(String).join(', ') : issue.message;
}

function foundAt(data: unknown, path: readonly PropertyKey[]): string {
  let value: unknown = data;
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return 'nothing';
    value = (value as Record<PropertyKey, unknown>)[key];
  }
  return value === undefined ? 'nothing' : JSON.stringify(value).slice(0, 80);
}
