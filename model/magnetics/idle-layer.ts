/** Loss in a layer that carries no current but sits in the field of another: the idle half of a centre-tapped winding. */
import { dowell } from './dowell.ts';

/**
 * Loss factor of one idle layer in the field that `fieldLayers` layers of the working winding build up: P = R(layer)·I²·factor,
 * factor = fieldLayers²·2·x·(sinh x − sin x)/(cosh x + cos x), written with Dowell's F: F(x, 2) − F(x, 1) =
 * 2·x·(sinh x − sin x)/(cosh x + cos x). `x` layer thickness over skin depth.
 * @source dowell-1966, proximity term of a layer
 * @valid field parallel to the layer
 * @example idleLayerFactor(1, 1) = 0.32037
 */
export function idleLayerFactor(x: number, fieldLayers: number): number {
  return fieldLayers * fieldLayers * (dowell(x, 2) - dowell(x, 1));
}
