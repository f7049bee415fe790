/** The half bridge with a capacitor divider: Vo = δ·Vi/(2n) with a centre tap, half of it with a current doubler. */
import { transformerStage } from './transformer-stages.ts';

export const halfBridgeCentreTap = transformerStage('half-bridge-centre-tap', 'half bridge, centre tap', {
  share: 0.5,
  inSeries: 1,
  doubleEnded: true,
  doubler: false,
  centreTap: true,
});

export const halfBridgeCurrentDoubler = transformerStage(
  'half-bridge-current-doubler',
  'half bridge, current doubler',
  {
    share: 0.5,
    inSeries: 1,
    doubleEnded: true,
    doubler: true,
    centreTap: false,
  },
);
