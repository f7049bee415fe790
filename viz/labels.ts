/**
 * Words for the names that data carry: `outputCeramicCount` and `output-ripple` become what a person would say. Every name
 * that the model can emit stands here; one that does not is split into words.
 */
import { STAGES } from '../model/stages/list.ts';

/** Slots of parts and the bodies that losses heat. */
export const PARTS: Readonly<Record<string, string>> = {
  highSwitch: 'high switch',
  lowSwitch: 'low switch',
  powerStage: 'power stage',
  diode: 'diode',
  clampDiode: 'clamp diode',
  inductor: 'inductor',
  transformer: 'transformer',
  outputCeramic: 'output ceramic',
  outputBulk: 'output bulk',
  inputCeramic: 'input ceramic',
  inputBulk: 'input bulk',
  dividerCeramic: 'divider ceramic',
  filterChoke: 'input filter choke',
  controller: 'controller',
  board: 'board',
  bridgeControl: 'bridge control',
  chokeCore: 'choke core',
  chokeMaterial: 'choke core material',
  chokeConductor: 'choke conductor',
  transformerCore: 'transformer core',
  transformerMaterial: 'transformer core material',
  primaryConductor: 'primary conductor',
  secondaryConductor: 'secondary conductor',
};

/** Effects that lose watts. */
export const EFFECTS: Readonly<Record<string, string>> = {
  conduction: 'conduction',
  overlap: 'switching overlap',
  outputCharge: 'output charge',
  recovery: 'reverse recovery',
  deadTime: 'dead time',
  gate: 'gate drive',
  loop: 'loop inductance',
  leakage: 'leakage current',
  winding: 'winding',
  windingAc: 'winding, ac',
  core: 'core',
  copper: 'copper',
  seriesResistance: 'series resistance',
  quiescent: 'quiescent current',
  driveSupply: 'drive supply',
};

/** Architectures, as an engineer says them. */
export const ARCHITECTURE_WORDS: Readonly<Record<string, string>> = Object.fromEntries(
  STAGES.map(({ architecture, words }) => [architecture, words]),
);

/** What the search moves. */
export const VARIABLES: Readonly<Record<string, string>> = {
  architecture: 'architecture',
  phases: 'phases',
  frequency: 'frequency',
  inductance: 'inductance',
  inductorSeries: 'inductor series',
  highParallel: 'high switches in parallel',
  lowParallel: 'low switches in parallel',
  outputCeramicCount: 'output ceramics, pieces',
  outputBulkCount: 'output bulks, pieces',
  inputCeramicCount: 'input ceramics, pieces',
  inputBulkCount: 'input bulks, pieces',
  chokeBuild: 'choke',
  chokeTurns: 'choke turns',
  primaryTurns: 'primary turns',
  secondaryTurns: 'secondary turns',
  legBuild: 'switch leg',
};

/** Objectives; what stands after a comma may be left out where room is scarce. */
export const OBJECTIVE_WORDS: Readonly<Record<string, string>> = {
  loss: 'loss, profile mean',
  inefficiency: 'inefficiency, profile mean',
  'full-load-loss': 'loss at full load',
  volume: 'volume',
  cost: 'cost',
  mass: 'mass',
  'board-area': 'board area',
};

/** Limits; one for a load's least efficiency carries its load in its name. */
export const LIMITS: Readonly<Record<string, string>> = {
  outputRipple: 'output ripple',
  inputRipple: 'input ripple',
  filterChoke: 'filter choke in the tables',
  filterDamping: 'input filter impedance',
  loadStep: 'load step',
  highJunction: 'high switch junction',
  lowJunction: 'low switch junction',
  inductorTemperature: 'inductor temperature',
  boardTemperature: 'board temperature',
  thermalRunaway: 'thermal runaway, loop gain',
  saturation: 'choke current to saturation',
  switchCurrent: 'switch current',
  minimumOnTime: 'shortest on-time',
  minimumOffTime: 'shortest off-time',
  outputCeramicCurrent: 'output ceramic ripple current',
  outputBulkCurrent: 'output bulk ripple current',
  inputCeramicCurrent: 'input ceramic ripple current',
  inputBulkCurrent: 'input bulk ripple current',
  bulkTemperature: 'bulk capacitor temperature',
  highVoltage: 'high switch voltage',
  lowVoltage: 'low switch voltage',
  gateVoltage: 'gate voltage',
  driveVoltage: 'gate drive voltage',
  phases: 'phases of the controller',
  controllerFrequency: 'controller’s highest frequency',
  controllerLowestFrequency: 'controller’s lowest frequency',
  controllerAbilities: 'controller drives this stage',
  avoidedBands: 'clearance from avoided bands',
  chokeWindow: 'choke window filled',
  chokeReach: 'choke inductance within reach',
  chokeMaterial: 'choke material in its range',
  transformerWindow: 'transformer window filled',
  transformerMaterial: 'transformer material in its range',
  transformerFlux: 'transformer flux density',
  transformerDuty: 'transformer duty',
  transformerTemperature: 'transformer temperature',
  height: 'height',
  boardArea: 'board area',
  volume: 'volume',
  mass: 'mass',
  cost: 'cost',
  noLoadPower: 'input power at no load',
  bulkLife: 'life of wet electrolytics',
};

/** Currents and voltages over a period, contributions that are no part, and modes. */
const OTHERS: Readonly<Record<string, string>> = {
  phaseCurrent: 'one phase',
  summedCurrent: 'all phases',
  inputCurrent: 'from the input',
  outputRipple: 'output ripple',
  inputRipple: 'input ripple',
  spacing: 'air between parts',
  heatSink: 'heat sink',
  placement: 'placing parts',
  'forced-continuous': 'forced continuous',
  'pulse-skipping': 'pulse skipping',
};

const SPOKEN: Readonly<Record<string, string>> = {
  ...LIMITS,
  ...OTHERS,
  ...EFFECTS,
  ...VARIABLES,
  ...PARTS,
  ...OBJECTIVE_WORDS,
  ...ARCHITECTURE_WORDS,
};

/** Lower-case words of a camel-case or hyphenated name; digits and units stay as they are. */
export function spoken(name: string): string {
  return Object.hasOwn(SPOKEN, name) ? (SPOKEN[name] ?? name) : apart(name);
}

function apart(name: string): string {
  return name
    .replace(/([a-z0-9])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`)
    .replace(
      /@(-?)([\d.]+)%/g,
      (_, sign: string, load: string) => ` at ${load}\u00a0% load${sign === '' ? '' : ' in reverse'}`,
    )
    .replace(/[-_]+/g, ' ');
}

/** A limit's name in words, where the same name may mean a part elsewhere: `efficiency@50%` → `efficiency at 50 % load`. */
export function spokenLimit(name: string): string {
  return Object.hasOwn(LIMITS, name) ? (LIMITS[name] ?? name) : apart(name);
}

/** A sentence of the model with the limits' names in it put into words, and no break between a number and its unit. */
export function inWords(sentence: string): string {
  const said = sentence.replace(/[a-z]+(?:[A-Z][a-z]+)+|efficiency@-?[\d.]+%/g, (name) => spokenLimit(name));
  return said.replace(/(\d) (?=[^\s,]{1,3}(?:[\s,]|$))/g, '$1\u00a0');
}

/** The same with a capital first letter. */
export function titled(name: string): string {
  return capital(spoken(name));
}

/** A capital first letter. */
export function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** `items` as a phrase: `a`, `a and b`, `a, b and c`. */
export function listed(items: readonly string[]): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;
}

/** `count` with its noun, singular or plural, thousands apart: `1 design`, `2 041 designs`. */
export function counted(count: number, noun: string, plural = `${noun}s`): string {
  return `${thousands(count)} ${count === 1 ? noun : plural}`;
}

/** A whole number with its thousands apart. */
export function thousands(count: number): string {
  return String(Math.round(count)).replace(/\B(?=(\d{3})+(?!\d))/g, '\u202f');
}
