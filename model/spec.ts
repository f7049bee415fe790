/**
 * The design spec: one JSON file that holds a chosen design and what was expected of it, with a published schema. Reading it
 * back gives the same design, and so the same assessment.
 */
import { z } from 'zod';
import type { DesignRecord } from './assessment.ts';
import { bad, type Finding, good, type Outcome } from './outcome.ts';
import { ARCHITECTURES } from './rail/rail.ts';

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
    const found = error instanceof Error ? error.message : 'text';
    return bad([{ file, line: 0, column: 0, field: '', found, allowed: 'a JSON spec' }]);
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
        allowed: issue.message,
      }),
    ),
  );
}

/** The design that a spec holds. */
export function recordOfSpec(spec: Spec): DesignRecord {
  return { architecture: spec.architecture, genes: spec.genes, parts: spec.parts };
}

function foundAt(data: unknown, path: readonly PropertyKey[]): string {
  let value: unknown = data;
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return 'nothing';
    value = (value as Record<PropertyKey, unknown>)[key];
  }
  return value === undefined ? 'nothing' : JSON.stringify(value).slice(0, 80);
}
