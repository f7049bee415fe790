/** From a sheet of good shape to the rail that the model works with. */
import { SHARE_ROUNDING } from './cross-checks.ts';
import { PROFILES } from './profiles.ts';
import type { LoadPoint, Rail, SheetLimits, VoltageRange } from './rail.ts';
import type { Sheet } from './schema.ts';

/** The rail of `sheet`. */
export function buildRail(sheet: Sheet): Rail {
  const { input, output, environment, tolerances, derating, advanced } = sheet;
  const step = sheet['load-step'];
  return {
    name: sheet.rail,
    currency: sheet.currency,
    quantity: sheet.quantity,
    input: {
      ...range(input.voltage),
      sourceResistance: input.source.resistance,
      sourceInductance: input.source.inductance,
      ...(input.ripple === undefined ? {} : { ripple: input.ripple }),
      ...(input['source-ripple'] === undefined ? {} : { sourceRipple: input['source-ripple'] }),
      takesPower: input['takes-power'],
    },
    output: { ...range(output.voltage), current: output.current, ripple: output.ripple, battery: output.battery },
    ...(step === undefined ? {} : { step }),
    profile: profileOf(sheet['load-profile']),
    lightLoad: sheet['light-load'],
    ambient: environment.ambient,
    airSpeed: environment.air,
    coolingArea: environment['board-area'],
    limits: limitsOf(sheet.limits),
    avoid: sheet.avoid,
    tolerances: {
      inductance: tolerances.inductance,
      capacitance: tolerances.capacitance,
      oscillator: tolerances.oscillator,
      onResistance: tolerances['on-resistance'],
    },
    derating: {
      switchVoltage: derating['switch-voltage'],
      ceramicVoltage: derating['ceramic-voltage'],
      bulkVoltage: derating['bulk-voltage'],
      rippleCurrent: derating['ripple-current'],
      temperature: derating.temperature,
    },
    search: searchOf(sheet.search),
    objectives: sheet.objectives,
    parts: { tables: sheet.parts.tables, barred: sheet.parts.bar, preferred: sheet.parts.prefer },
    ...(sheet.incumbents.length === 0 ? {} : { incumbents: sheet.incumbents }),
    settings: {
      islands: advanced.islands,
      population: advanced.population,
      epochGenerations: advanced['epoch-generations'],
      frontSize: advanced['front-size'],
    },
  };
}

function range({ min, nominal, max }: Sheet['input']['voltage']): VoltageRange {
  return { minimum: min, nominal, maximum: max };
}

/** Shares that miss 1 by rounding are scaled to it; exact ones stay as written. */
function profileOf(profile: Sheet['load-profile']): readonly LoadPoint[] {
  if (typeof profile === 'string') return PROFILES[profile];
  const sum = profile.reduce((total, { share }) => total + share, 0);
  const exact = Math.abs(sum - 1) < 1e-9 || Math.abs(sum - 1) > SHARE_ROUNDING;
  return profile.map(({ load, share }) => ({ fraction: load, share: exact ? share : share / sum }));
}

function limitsOf(limits: Sheet['limits']): SheetLimits {
  const { height, volume, mass, cost, life } = limits;
  const boardArea = limits['board-area'];
  const noLoadPower = limits['no-load-power'];
  const minimumOnTime = limits['minimum-on-time'];
  return {
    ...(height === undefined ? {} : { height }),
    ...(volume === undefined ? {} : { volume }),
    ...(boardArea === undefined ? {} : { boardArea }),
    ...(mass === undefined ? {} : { mass }),
    ...(cost === undefined ? {} : { cost }),
    efficiency: limits.efficiency.map((entry) => ({ load: entry.load, atLeast: entry['at-least'] })),
    ...(noLoadPower === undefined ? {} : { noLoadPower }),
    ...(minimumOnTime === undefined ? {} : { minimumOnTime }),
    ...(life === undefined ? {} : { life }),
  };
}

function searchOf(search: Sheet['search']): Rail['search'] {
  const bounds = ({
    from,
    to,
  }: {
    readonly from: number;
    readonly to: number;
  }): { minimum: number; maximum: number } => ({
    minimum: from,
    maximum: to,
  });
  return {
    architectures: search.architectures,
    phases: bounds(search.phases),
    frequency: bounds(search.frequency),
    inductance: bounds(search.inductance),
    woundChokes: search['wound-chokes'],
    parallelSwitches: search['parallel-switches'],
    ceramics: search.ceramics,
    bulks: search.bulks,
  };
}
