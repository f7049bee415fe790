/** Heat: thermal paths, surfaces, heat sinks. */
export { fixedPoint, mixedFixedPoint, parallelResistance, pathTemperature } from './resistance.ts';
export { sinkVolume, sinkVolumeByIndex, VOLUMETRIC_RESISTANCE, volumetricResistance } from './sink.ts';
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
