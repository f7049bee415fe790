/** Builds a transformer stage from its form: what the files of the architectures share. */
import { addIsolatedEdges } from '../isolated-edges.ts';
import type { Stage } from './contract.ts';
import { type IsolatedForm, isolatedDuty, isolatedRefusal, rectifierVoltage, solveIsolated } from './isolated.ts';

/** Duty of the rising interval that is left to a stage after resets and dead times: half periods of a bridge, reset of a forward. */
const HIGHEST = { bridge: 0.95, doubler: 0.475, forward: 0.47 } as const;

/** The stage called `architecture` in data and `words` by people, with `form`. */
export function transformerStage<const Name extends string>(
  architecture: Name,
  words: string,
  form: IsolatedForm,
): Stage<Name> {
  return {
    architecture,
    words,
    twoWay: false,
    diode: false,
    packagedLegs: false,
    form,
    windings: form.centreTap ? 'centre-tap' : form.doubler ? 'current-doubler' : 'forward',
    control: form.doubleEnded ? 'bridge' : 'forward',
    highDevices: form.doubleEnded && form.inSeries === 2 ? 4 : 2,
    lowDevices: 2,
    chokes: form.doubler ? 2 : 1,
    chokeMultiple: form.doubleEnded && !form.doubler ? 2 : 1,
    highestDuty: form.doubler ? HIGHEST.doubler : form.doubleEnded ? HIGHEST.bridge : HIGHEST.forward,
    idealDuty: (inputVoltage, outputVoltage, ratio) => isolatedDuty(form, inputVoltage, outputVoltage, ratio),
    lowBlocking: (inputVoltage, ratio) => rectifierVoltage(form, inputVoltage, ratio),
    refusal: isolatedRefusal,
    solve: (design, state) => solveIsolated(form, design, state),
    addEdgeLosses: (design, state, ledger) => addIsolatedEdges(form, design, state, ledger),
  };
}
