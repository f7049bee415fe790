/** The full bridge, hard switched: Vo = δ·Vi/n with a centre tap, half of it with a current doubler. */
import { transformerStage } from './transformer-stages.ts';

export const fullBridgeCentreTap = transformerStage('full-bridge-centre-tap', 'full bridge, centre tap', {
  share: 1,
  inSeries: 2,
  doubleEnded: true,
  doubler: false,
  centreTap: true,
});

export const fullBridgeCurrentDoubler = transformerStage(
  'full-bridge-current-doubler',
  'full bridge, current doubler',
  {
    share: 1,
    inSeries: 2,
    doubleEnded: true,
    doubler: true,
    centreTap: false,
  },
);
