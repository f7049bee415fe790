/** The model's face: sheet and parts in, space and assessments out. */
export type {
  Assessment,
  Corner,
  DesignRecord,
  LimitFigure,
  LossItem,
  Mode,
  ObjectiveFigure,
  PartUse,
  PointReport,
  Share,
  Trace,
} from './assessment.ts';
export { cautionsOf, NOT_COVERED, STANDING_CAUTION, TOUCH_VOLTAGE } from './cautions.ts';
export { type ArchitectureVerdict, explainRail, type Fact, type RailExplanation } from './explain.ts';
export { type FamilyTally, familyReason } from './families.ts';
export { type FrontDesign, type FrontFile, frontCsv, frontFile, quoteCell } from './front-file.ts';
export { stepNetlist } from './handoff/netlist/loop.ts';
export type { LossTerm, Prediction, Reading } from './handoff/netlist/predictions.ts';
export { agreesWith } from './handoff/netlist/predictions.ts';
export { stageNetlist } from './handoff/netlist/stage-netlist.ts';
export { designNote, type HandoffContext } from './handoff/note.ts';
export type { Proof, ProofCorner, ProofFigure, ProofLimit } from './handoff/proof.ts';
export { fullLoad, solveAt } from './handoff/solved-point.ts';
export { type NamedFile, takeAway } from './handoff/take-away.ts';
export { bad, describeFinding, type Finding, good, type Outcome } from './outcome.ts';
export * from './parts/index.ts';
export { readPlainDesign } from './plain-design.ts';
export {
  bestGainOf,
  freeLimits,
  type Gain,
  gainOf,
  howPriced,
  isTelling,
  type Miss,
  RELAXED_BY,
  type Relaxations,
  type RequirementPrice,
  requirementPrices,
} from './prices.ts';
export { createRailProblem, type Judgement, type RailProblem } from './problem.ts';
export * from './quantity/index.ts';
export * from './rail/index.ts';
export type { ObjectiveName, Rail } from './rail/rail.ts';
export { OBJECTIVES } from './rail/rail.ts';
export { type Representative, representativesOf } from './representatives.ts';
export { readSpec, recordOfSpec, SPEC_SCHEMA, type Spec } from './spec.ts';
export { CAUSES, drawSamples } from './spread/sample.ts';
export { type Spread, spreadOf, summarise } from './spread/spread.ts';
export { ARCHITECTURES, type Architecture } from './stages/list.ts';
export { type Change, type Distance, type Standing, standingOf } from './standing.ts';
export { MODEL_VERSION } from './version.ts';
export { writeSpec } from './write-spec.ts';
