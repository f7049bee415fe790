/** The written-down hashes of `hash.ts`, one a function, over its default count. */
export const HASHES: Readonly<Record<string, number>> = {
  exp: 1121500773,
  expm1: 2803662049,
  log: 996990670,
  log2: 3654330160,
  log10: 2363768931,
  pow: 1860665875,
  sin: 2782528168,
  cos: 2554675027,
  tan: 1387439684,
  atan: 1968579522,
  sinh: 4168351368,
  cosh: 2940814715,
  tanh: 1265448821,
  cbrt: 1797072654,
  hypot: 2324617916,
};
