/** 95 % one-sided quantile of the normal distribution. */
export const NORMAL_95 = 1.6448536269514722;

/** Quantile of Student's t at 95 %, one-sided, for at least one degree of freedom, by bisection of its distribution. */
export function student95(degrees: number): number {
  let low = NORMAL_95;
  let high = 7;
  for (let step = 0; step < 200; step += 1) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (1 - upperTail(middle, degrees) < 0.95) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Probability above t > 0: half the regularised incomplete beta function at ν / (ν + t²). */
const upperTail = (t: number, degrees: number): number =>
  0.5 * incompleteBeta(degrees / (degrees + t * t), degrees / 2, 0.5);

/** Regularised incomplete beta function, by its continued fraction on the side where that converges. */
function incompleteBeta(x: number, a: number, b: number): number {
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x));
  return x < (a + 1) / (a + b + 2)
    ? (front * continuedFraction(x, a, b)) / a
    : 1 - (front * continuedFraction(1 - x, b, a)) / b;
}

/** Lentz's evaluation of the fraction of the incomplete beta function. */
function continuedFraction(x: number, a: number, b: number): number {
  const tiny = 1e-300;
  const kept = (value: number) => (Math.abs(value) < tiny ? tiny : value);
  let c = 1;
  let d = 1 / kept(1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m < 1000; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / kept(1 + even * d);
    c = kept(1 + even / c);
    value *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / kept(1 + odd * d);
    c = kept(1 + odd / c);
    const change = d * c;
    value *= change;
    if (Math.abs(change - 1) < 1e-15) break;
  }
  return value;
}

/** Logarithm of the gamma function for x > 0: Stirling's series after shifting x beyond ten. */
function logGamma(x: number): number {
  let shift = 0;
  let at = x;
  while (at < 10) {
    shift -= Math.log(at);
    at += 1;
  }
  const square = 1 / (at * at);
  const series = (1 / 12 - square * (1 / 360 - square * (1 / 1260 - square / 1680))) / at;
  return shift + (at - 0.5) * Math.log(at) - at + 0.5 * Math.log(2 * Math.PI) + series;
}
