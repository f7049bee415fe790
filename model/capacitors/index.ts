/** Capacitors: what they hold, how they ripple, how they heat. */
export {
  type Bank,
  type BankRipple,
  createBank,
  createBankRipple,
  setGroup1,
  setGroup2,
} from './bank.ts';
export { isPair, pairTransient } from './bank-pair.ts';
export { bankCurrents, bankRipple } from './bank-ripple.ts';
export { type BankTrace, bankTrace } from './bank-trace.ts';
export { ceramicCapacitance, ceramicWorstFactor } from './ceramic.ts';
export { electrolyticCost, filmCost } from './cost.ts';
export { cancellation, capacitiveRipple, inputChargeRipple, inputMeanSquare } from './ripple.ts';
export { electrolyticLife, electrolyticLifeAt, selfHeating, seriesLoss } from './stress.ts';
