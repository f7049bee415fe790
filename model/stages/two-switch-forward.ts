/** The two-switch forward stage: one pulse a period, reset through two diodes to the input, Vo = D·Vi/n. */
import { transformerStage } from './transformer-stages.ts';

export const twoSwitchForward = transformerStage('two-switch-forward', 'two-switch forward', {
  share: 1,
  inSeries: 2,
  doubleEnded: false,
  doubler: false,
  centreTap: false,
});
