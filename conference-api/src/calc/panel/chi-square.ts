/** Coefficients of Lanczos' approximation for g = 7, n = 9, the constant first. */
const LANCZOS_CONSTANT = 0.99999999999980993;
const LANCZOS: readonly number[] = [
  676.5203681218851, -1259.1392167224028, 771.32342877765313,
  -176.61502916214059, 12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6,
  1.5056327351493116e-7,
];

const MOST_TERMS = 10_000;
const SMALLEST = 1e-300;

/**
 * The chance that a chi-square variable with `df` degrees of freedom exceeds `x`.
 * `df` is 1 or more, `x` 0 or more; the answer lies in [0, 1], with a relative
 * error around 1e-13.
 *
 * Source: Abramowitz & Stegun 26.4.19 with the series 6.5.29 and the continued
 * fraction 6.5.31 of the incomplete gamma function.
 */
export function chiSquareSurvival(x: number, df: number): number {
  if (x <= 0) return 1;
  const a = df / 2;
  const half = x / 2;
  const front = Math.exp(a * Math.log(half) - half - logGamma(a));
  return half < a + 1 ? 1 - front * lowerSeries(half, a) : front * upperFraction(half, a);
}

function lowerSeries(x: number, a: number): number {
  let term = 1 / a;
  let total = term;
  for (let n = 1; n < MOST_TERMS && term > total * Number.EPSILON; n += 1) {
    term *= x / (a + n);
    total += term;
  }
  return total;
}

/** Lentz's method; the fraction converges quickly for x > a + 1. */
function upperFraction(x: number, a: number): number {
  let b = x + 1 - a;
  let c = 1 / SMALLEST;
  let d = 1 / b;
  let value = d;
  for (let i = 1; i < MOST_TERMS; i += 1) {
    const step = -i * (i - a);
    b += 2;
    d = 1 / awayFromZero(step * d + b);
    c = awayFromZero(b + step / c);
    const change = d * c;
    value *= change;
    if (Math.abs(change - 1) < Number.EPSILON) break;
  }
  return value;
}

function awayFromZero(value: number): number {
  return Math.abs(value) < SMALLEST ? SMALLEST : value;
}

/** ln Γ(a) for a ≥ 0.5. */
function logGamma(a: number): number {
  const shifted = a - 1;
  const series = LANCZOS.reduce(
    (total, coefficient, i) => total + coefficient / (shifted + i + 1),
    LANCZOS_CONSTANT,
  );
  const t = shifted + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (shifted + 0.5) * Math.log(t) - t + Math.log(series);
}
