/** A core set for a wound part: both halves with bobbin, ungapped; the gap and the material are chosen by the search. */
import type { Part } from './common.ts';

export interface Core extends Part {
  /** Shape family of IEC 63093: E, ETD, RM, PQ, planar ELP (+I: with a plate), or ring. */
  readonly shape: 'E' | 'ETD' | 'RM' | 'PQ' | 'ELP' | 'ring';
  /** Effective area, m². */
  readonly area: number;
  /** Smallest area, m²: saturation is judged here. */
  readonly minimumArea: number;
  /** Effective magnetic length, m. */
  readonly pathLength: number;
  /** Effective volume, m³. */
  readonly coreVolume: number;
  /** Room for the winding along the layers, inside the bobbin, m. */
  readonly windowBreadth: number;
  /** Room for the winding across the layers, inside the bobbin, m. */
  readonly windowHeight: number;
  /** Mean length of a turn, m. */
  readonly turnLength: number;
  /** Outer surface of the wound part, m². */
  readonly surface: number;
}
