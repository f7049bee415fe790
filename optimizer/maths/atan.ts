/**
 * Arc tangent, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
/** arctan of 0.5, 1, 1.5 and ∞, each with the rest that follows it. */
const HIGH = [0.4636476090008061, 0.7853981633974483, 0.982793723247329, 1.5707963267948966];
const REST = [2.2698777452961687e-17, 3.061616997868383e-17, 1.3903311031230998e-17, 6.123233995736766e-17];

/** arctan x in radians, −π/2 … π/2; error under 1 ulp. */
export function atan(x: number): number {
  const size = Math.abs(x);
  if (!(size >= 7.450580596923828e-9)) return x;
  if (size < 0.4375) return x - x * series(x);
  const sign = x < 0 ? -1 : 1;
  if (size >= 73786976294838210000) return sign * (HIGH[3] + REST[3]);
  const interval = size < 0.6875 ? 0 : size < 1.1875 ? 1 : size < 2.4375 ? 2 : 3;
  const t = reducedArgument(size, interval);
  return sign * (HIGH[interval] - (t * series(t) - REST[interval] - t));
}

/** tan(arctan x − arctan b) for the interval's b. */
function reducedArgument(x: number, interval: number): number {
  if (interval === 0) return (2 * x - 1) / (2 + x);
  if (interval === 1) return (x - 1) / (x + 1);
  if (interval === 2) return (x - 1.5) / (1 + 1.5 * x);
  return -1 / x;
}

/** 1 − arctan(x)/x. */
function series(x: number): number {
  const z = x * x;
  const w = z * z;
  const odd =
    z *
    (0.3333333333333293 +
      w *
        (0.14285714272503466 +
          w *
            (0.09090887133436507 + w * (0.06661073137387531 + w * (0.049768779946159324 + w * 0.016285820115365782)))));
  const even =
    w *
    (-0.19999999999876483 +
      w * (-0.11111110405462356 + w * (-0.0769187620504483 + w * (-0.058335701337905735 + w * -0.036531572744216916))));
  return odd + even;
}
