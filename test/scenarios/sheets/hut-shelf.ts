/** 400 V to 12 V: turns, leakage, cautions. */
import { hasTransformer } from '../../../model/catalogue.ts';
import { cautionsOf } from '../../../model/cautions.ts';
import type { Architecture } from '../../../model/stages/list.ts';
import type { Sweep } from '../spaces.ts';
import { percent, type Statement, stated } from '../statement.ts';
import { turnsNear } from './questions.ts';

/** What its row says; each side search may spend `evaluations`. */
export function shelf(found: Sweep, evaluations: number): Statement[] {
  const name = 'hut-shelf';
  const { rail } = found.problem;
  const shock = cautionsOf(rail).filter((caution) => /60 V/.test(caution));
  return [
    turnsNear(name, 'two-switch-forward', 11, evaluations),
    turnsNear(name, 'half-bridge-centre-tap', 11, evaluations),
    turnsNear(name, 'full-bridge-centre-tap', 22, evaluations),
    leakageCostsDuty(found),
    stated(name, 'the sheet cautions above 60 V', `${shock.length} caution`, shock.length === 1, 'the sheet'),
  ];
}

/** Duty that the leakage of the balanced design takes, beside the duty that the output needs. */
function leakageCostsDuty(found: Sweep): Statement {
  const member = found.members.find(({ family }) => hasTransformer(family.split(' ')[0] as Architecture));
  if (member === undefined) return stated('hut-shelf', 'leakage costs duty', 'no transformer stage', false);
  const { limits, points } = found.problem.assess(member.genes);
  const limit = limits.find(({ name }) => name === 'transformerDuty');
  const { corner } = limit ?? {};
  const at = points.find((p) => p.share === 0 && p.load === corner?.load && p.inputVoltage === corner.inputVoltage);
  const lost = (limit?.value ?? Number.NaN) - (at?.dutyCycle ?? Number.NaN);
  return stated('hut-shelf', 'leakage costs duty', percent(lost), lost > 1e-4 && lost < 0.2);
}
