/**
 * Everything one page embeds: what a runner gathers from the run folder and hands to `buildPage`. All values are SI base
 * units and the sheet's currency. `pack.ts` turns it into the compact island inside the page and back.
 */
import type { FrontDesign, FrontFile } from '../model/front-file.ts';
import type { Proof } from '../model/handoff/proof.ts';
import type { PartsTables } from '../model/parts/tables.ts';
import type { Relaxations } from '../model/prices.ts';
import type { Rail } from '../model/rail/rail.ts';

export type { FrontDesign };

/** The part of `front.json` that the page needs. */
export type Front = Pick<FrontFile, 'objectives' | 'limits' | 'genes' | 'designs'>;

/** How the sweep went. */
export interface RunRecord {
  readonly status: 'running' | 'stopped' | 'done' | 'failed';
  readonly seed: string;
  readonly evaluations: number;
  readonly epochs: number;
  /** Wall clock, s. */
  readonly seconds: number;
  readonly threads: number;
  /** Share of the evaluated designs that keep every limit, 0 … 1. */
  readonly feasibleShare: number;
  /** Hypervolume of the archive as a share of the box between ideal and reference, 0 … 1. */
  readonly hypervolume: number;
  /** Hypervolume of each island's own members over the whole's, 0 … 1; absent where islands are not known apart. */
  readonly agreement?: readonly number[];
  readonly version: string;
  readonly railHash: string;
  readonly partsHash: string;
  /** When the page was built, ISO 8601; the runner reads the clock. */
  readonly built: string;
}

/** One row of the search's history. */
export interface HistoryRow {
  readonly evaluations: number;
  /** Of the merged archive, 0 … 1. */
  readonly hypervolume: number;
  /** Of each island's own members, 0 … 1, in island order; may be empty. */
  readonly islands: readonly number[];
}

/** The evaluated designs behind the front, feasible ones, possibly a sample. */
export interface Cloud {
  /** Family names that `family` indexes. */
  readonly families: readonly string[];
  /** Family index of each point. */
  readonly family: ArrayLike<number>;
  /** Objectives of each point, one point after the other. */
  readonly objectives: ArrayLike<number>;
}

/** A design that breaks exactly one limit by a little and would beat the front. */
export interface NearMiss {
  readonly limit: string;
  /** What the design has and what the limit allows, in the limit's unit. */
  readonly value: number;
  readonly allowed: number;
  /** By what fraction it misses, as the search counts. */
  readonly violation: number;
  readonly design: FrontDesign;
}

/** Why a family of designs is on the front, or is not. */
export interface FamilyNote {
  readonly family: string;
  /** Designs evaluated, feasible ones among them, and on the front. */
  readonly evaluated: number;
  readonly feasible: number;
  readonly front: number;
  /** One line in plain words. */
  readonly reason: string;
}

/** The whole page's content. */
export interface PageData {
  readonly run: RunRecord;
  readonly rail: Rail;
  /** Every row that what-if may choose; at least those that a shown design uses. */
  readonly tables: PartsTables;
  /** At most a few thousand designs. */
  readonly front: Front;
  readonly cloud: Cloud;
  readonly history: readonly HistoryRow[];
  readonly nearMisses: readonly NearMiss[];
  /** Short searches with a limit relaxed; absent where none were made. */
  readonly relaxations?: Relaxations;
  readonly families: readonly FamilyNote[];
  readonly cautions: readonly string[];
  readonly notCovered: readonly string[];
  /** Ids of front designs that the sheet named as existing ones. */
  readonly incumbents?: readonly string[];
  /** Circuit simulations of designs, by id; absent where none were made. */
  readonly proofs?: readonly Proof[];
}

/** Texts that the build leaves beside the compiled code and the runner reads from there. */
export interface PageAssets {
  /** `dist/viz/live.js`: viz/live.ts bundled as one IIFE. */
  readonly script: string;
  /** `dist/viz/theme.css`: a copy of viz/theme.css. */
  readonly style: string;
}
