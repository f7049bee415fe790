/** Heat: thermal paths, surfaces, heat sinks. */
export { boardConductance } from './board.ts';
export { fixedPoint, mixedFixedPoint, parallelResistance, pathTemperature } from './resistance.ts';
export {
  sinkCost,
  sinkMass,
  sinkVolume,
  sinkVolumeByIndex,
  VOLUMETRIC_RESISTANCE,
  volumetricResistance,
} from './sink.ts';
export {
  EMISSIVITY,
  forcedConvection,
  MCLYMAN_RISE,
  naturalConvection,
  radiation,
  STEFAN_BOLTZMANN,
  surfaceCoefficient,
  surfacePower,
  surfaceRise,
} from './surface.ts';
export { boardPath, sideSurface } from './two-paths.ts';
