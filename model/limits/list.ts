/** Every limit that can bind, in one list: name, unit, sense, and when a rail has it. */
import { hasTransformer } from '../catalogue.ts';
import type { Rail } from '../rail/rail.ts';
import type { LimitDefinition } from './book.ts';

interface Offer<Name extends string> extends LimitDefinition {
  readonly name: Name;
  readonly when: (rail: Rail) => boolean;
}

const always = (): boolean => true;
const wound = (rail: Rail): boolean => rail.search.woundChokes === true;
const transformer = (rail: Rail): boolean => rail.search.architectures.some(hasTransformer);
const most = <const Name extends string>(
  name: Name,
  unit: string,
  when: (rail: Rail) => boolean = always,
): Offer<Name> => ({
  name,
  unit,
  sense: 'most',
  when,
});
const least = <const Name extends string>(
  name: Name,
  unit: string,
  when: (rail: Rail) => boolean = always,
): Offer<Name> => ({
  name,
  unit,
  sense: 'least',
  when,
});

const OFFERS = [
  most('outputRipple', 'V'),
  most('inputRipple', 'V', (rail) => rail.input.ripple !== undefined),
  { ...least('filterChoke', '', (rail) => rail.input.sourceRipple !== undefined), whole: true },
  most('filterDamping', 'Ω', (rail) => rail.input.sourceInductance > 0 || rail.input.sourceRipple !== undefined),
  most('loadStep', 'V', (rail) => rail.step !== undefined),
  most('highJunction', 'K'),
  most('lowJunction', 'K'),
  most('inductorTemperature', 'K'),
  most('boardTemperature', 'K'),
  most('thermalRunaway', ''),
  most('saturation', 'A'),
  most('switchCurrent', 'A'),
  least('minimumOnTime', 's'),
  least('minimumOffTime', 's'),
  most('outputCeramicCurrent', 'A'),
  most('outputBulkCurrent', 'A'),
  most('inputCeramicCurrent', 'A'),
  most('inputBulkCurrent', 'A'),
  most('bulkTemperature', 'K'),
  { ...most('highVoltage', 'V'), whole: true },
  { ...most('lowVoltage', 'V'), whole: true },
  { ...most('gateVoltage', 'V'), whole: true },
  { ...least('driveVoltage', 'V'), whole: true },
  { ...most('phases', ''), whole: true },
  most('controllerFrequency', 'Hz'),
  least('controllerLowestFrequency', 'Hz'),
  { ...least('controllerAbilities', ''), whole: true },
  least('avoidedBands', 'Hz', (rail) => rail.avoid.length > 0),
  most('chokeWindow', '', wound),
  { ...most('chokeReach', '', wound), whole: true },
  { ...most('chokeMaterial', '', wound), whole: true },
  most('transformerWindow', '', transformer),
  { ...most('transformerMaterial', '', transformer), whole: true },
  most('transformerFlux', 'T', transformer),
  most('transformerDuty', '', transformer),
  most('transformerTemperature', 'K', transformer),
  most('height', 'm', (rail) => rail.limits.height !== undefined),
  most('boardArea', 'm²', (rail) => rail.limits.boardArea !== undefined),
  most('volume', 'm³', (rail) => rail.limits.volume !== undefined),
  most('mass', 'kg', (rail) => rail.limits.mass !== undefined),
  most('cost', 'currency', (rail) => rail.limits.cost !== undefined),
  most('noLoadPower', 'W', (rail) => rail.limits.noLoadPower !== undefined),
  least('bulkLife', 's', (rail) => rail.limits.life !== undefined),
] as const;

/** Name of a limit; a least efficiency carries its load in its name and is none of these. */
export type LimitName = (typeof OFFERS)[number]['name'];

/** Every name, in the order of the list. */
export const LIMIT_NAMES: readonly LimitName[] = OFFERS.map(({ name }) => name);

/** The limits of `rail`, always in the same order; one for each load with a least efficiency comes last. */
export function limitsOf(rail: Rail): readonly LimitDefinition[] {
  const offers: readonly Offer<LimitName>[] = OFFERS;
  const listed = offers
    .filter((offer) => offer.when(rail))
    .map(({ name, unit, sense, whole }) => ({
      ...(whole === true ? { whole } : {}),
      name,
      unit: unit === 'currency' ? rail.currency : unit,
      sense,
    }));
  const efficiency = rail.limits.efficiency.map((limit) => ({
    name: efficiencyLimitName(limit.load),
    unit: '',
    sense: 'least' as const,
  }));
  return [...listed, ...efficiency];
}

/** Name of the efficiency limit at a load fraction: `efficiency@100%`. */
export function efficiencyLimitName(load: number): string {
  return `efficiency@${Math.round(load * 1000) / 10}%`;
}
