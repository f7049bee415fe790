/** Limits of parts wound to order: window, material range, flux, reach of the gap, duty left by leakage and reset. */
import type { Evaluator } from '../evaluate.ts';
import { materialViolation, saturationFlux } from '../magnetics/index.ts';

/** Flux that a single-ended core keeps without field, T (common practice, no source). */
const REMANENCE = 0.1;
/** Temperature at which saturation is judged, K. */
const HOT_CORE = 373.15;

/** Notes the limits of wound chokes and transformers at the solved worst point. */
export function judgeMagnetics(e: Evaluator, index: number): void {
  if (e.design.chokeMaterial !== undefined) judgeChoke(e, index);
  if (e.design.stage.form !== undefined) judgeTransformer(e, index);
}

/**
 * Window, reach and material range of a wound choke.
 * @derivation flux swing ½·ΔI·L/(N·Amin)
 * @valid the material's range: beyond it is a violation
 */
function judgeChoke(e: Evaluator, index: number): void {
  const { book, places, design } = e;
  const { state } = e.solver;
  const { woundChoke: choke, chokeMaterial: material } = design;
  if (material === undefined) return;
  book.judge(places.chokeWindow, choke.fill, 1, -1);
  book.judgeBy(places.chokeReach, choke.outOfReach, 0, 1, -1);
  const swing = 0.5 * state.rippleCurrent * choke.fluxPerAmpere;
  const frequency = design.frequency * design.stage.chokeMultiple;
  book.judgeBy(places.chokeMaterial, materialViolation(material, frequency, swing), 0, 1, index);
}

/**
 * Window, material range, flux and duty of a transformer.
 * @source ltc1698, page 16: Vi,max·Dmax/(f·Np·Ae) in a transient, remanence on top where the core is driven one way
 * @valid linear core up to its saturation
 */
function judgeTransformer(e: Evaluator, index: number): void {
  const { book, places, design, rail } = e;
  const { state } = e.solver;
  const { transformer, transformerChoice, stage } = design;
  if (transformerChoice === undefined || stage.form === undefined) return;
  const { material } = transformerChoice;
  book.judge(places.transformerWindow, transformer.fill, 1, -1);
  book.judgeBy(
    places.transformerMaterial,
    materialViolation(material, design.frequency, 0.5 * state.fluxSwing),
    0,
    1,
    index,
  );
  const longest = stage.form.doubleEnded ? 0.5 : stage.highestDuty;
  const volts = stage.form.share * rail.input.maximum;
  const swing = (volts * longest) / (design.frequency * transformer.primaryTurns * transformer.minimumArea);
  const flux = swing + (stage.form.doubleEnded ? 0 : REMANENCE);
  const most = saturationFlux(material.saturation25, material.saturation100, HOT_CORE);
  book.judge(places.transformerFlux, flux, most, -1);
  const duty = state.dutyCycle + state.lostDuty;
  book.judge(places.transformerDuty, duty, stage.highestDuty, index);
}
