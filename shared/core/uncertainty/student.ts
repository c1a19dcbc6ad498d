import { refuse } from '../refusal';
import { normalQuantile } from './normal-quantile';

/** From here on Student's distribution and the normal one are the same double: 1/ν is below half a unit in the last place. */
const LARGEST = 1e18;
const SQRT_PI = Math.sqrt(Math.PI);

/** Newton's steps square their error: after one of this relative size the next would be lost in rounding. */
const SETTLED = 1e-9;

/** What depends on ν alone. */
interface Shape {
  readonly nu: number;
  /** ν/2 */
  readonly a: number;
  /** Γ(a + ½)/Γ(a)/√π = 1/B(½, a) */
  readonly inverseBeta: number;
}

/** Γ(a + ½)/Γ(a): Stirling's asymptotic series at a ≥ 40, reached by the recurrence Γ(a + 1) = a·Γ(a). */
function gammaRatio(a: number): number {
  let shifted = a;
  let factor = 1;
  while (shifted < 40) {
    factor *= shifted / (shifted + 0.5);
    shifted += 1;
  }
  const r = 1 / shifted;
  const series =
    1 +
    r *
      (-1 / 8 +
        r *
          (1 / 128 +
            r *
              (5 / 1024 +
                r * (-21 / 32768 + r * (-399 / 262144 + r * (869 / 4194304 + (r * 39325) / 33554432))))));
  return factor * Math.sqrt(shifted) * series;
}

function shapeOf(degreesOfFreedom: number): Shape {
  const nu = Math.min(degreesOfFreedom, LARGEST);
  const a = nu / 2;
  return { nu, a, inverseBeta: gammaRatio(a) / SQRT_PI };
}

/** √y·(1 − y)^a/B(½, a) with y = t²/(ν + t²): the common factor of both expansions. */
function front({ nu, a, inverseBeta }: Shape, t: number): number {
  return (t / Math.sqrt(nu + t * t)) * inverseBeta * Math.exp(-a * Math.log1p((t * t) / nu));
}

function density({ nu, a, inverseBeta }: Shape, t: number): number {
  return (inverseBeta / Math.sqrt(nu)) * Math.exp(-(a + 0.5) * Math.log1p((t * t) / nu));
}

/** P(0 < T < t), t ≥ 0: the power series of I_y(½, a), all terms positive (DLMF 8.17.8). */
function centralPart(shape: Shape, t: number): number {
  const y = (t * t) / (shape.nu + t * t);
  let term = 1;
  let sum = 1;
  for (let n = 0; term > 1e-17 * sum; n++) {
    term *= (y * (shape.a + 0.5 + n)) / (1.5 + n);
    sum += term;
  }
  return front(shape, t) * sum;
}

/**
 * P(T > t) for t above about 1: the continued fraction of I_x(a, ½) in the form that stays well conditioned at large a
 * (Didonato and Morris, ACM Trans. Math. Softw. 18 (1992) 360, routine BFRAC).
 */
function upperPart(shape: Shape, t: number): number {
  const { nu, a } = shape;
  const y = (t * t) / (nu + t * t);
  const x = nu / (nu + t * t);
  const c = 0.5 + (a + 0.5) * y;
  const c0 = 0.5 / a;
  const c1 = 1 + 1 / a;
  let p = 1;
  let s = a + 1;
  let an = 0;
  let bn = 1;
  let anNext = 1;
  let bnNext = c / c1;
  let ratio = c1 / c;
  for (let n = 1; n < 10000; n++) {
    const share = n / a;
    const w = n * (0.5 - n) * x;
    const e = a / s;
    const alpha = p * (p + c0) * e * e * w * x;
    const beta = n + w / s + ((share + 1) / (c1 + share + share)) * (c + n * (y + 1));
    p = 1 + share;
    s += 2;
    const aNew = alpha * an + beta * anNext;
    const bNew = alpha * bn + beta * bnNext;
    const before = ratio;
    ratio = aNew / bNew;
    an = anNext / bNew;
    bn = bnNext / bNew;
    anNext = ratio;
    bnNext = 1;
    if (Math.abs(ratio - before) <= 1e-16 * ratio) break;
  }
  return 0.5 * front(shape, t) * ratio;
}

/** Up to here the power series keeps its digits; for small ν it slows down earlier. Beyond, the fraction takes over. */
const seriesLimit = (nu: number): number => (nu < 4 ? 1 : Math.sqrt(3));

function upperTail(shape: Shape, t: number): number {
  return t <= seriesLimit(shape.nu) ? 0.5 - centralPart(shape, t) : upperPart(shape, t);
}

/** P(T ≤ t) of Student's distribution; ν > 0 need not be whole, infinity is the normal distribution. */
export function studentCdf(t: number, degreesOfFreedom: number): number {
  if (t === 0) return 0.5;
  const shape = shapeOf(degreesOfFreedom);
  const magnitude = Math.abs(t);
  if (magnitude <= seriesLimit(shape.nu)) return 0.5 + Math.sign(t) * centralPart(shape, magnitude);
  const tail = magnitude === Infinity ? 0 : upperPart(shape, magnitude);
  return t > 0 ? 1 - tail : tail;
}

/** t with P(0 < T < t) = part, within the power series' reach: Newton from the left of a concave function. */
function quantileFromCentre(shape: Shape, part: number): number {
  let t = part / density(shape, 0);
  for (let i = 0; i < 50; i++) {
    const step = (part - centralPart(shape, t)) / density(shape, t);
    t += step;
    if (Math.abs(step) <= SETTLED * t) break;
  }
  return t;
}

function firstGuess({ nu, a, inverseBeta }: Shape, tail: number): number {
  const x = Math.pow((2 * a * tail) / inverseBeta, 1 / a);
  if (nu < 4 && x < 0.9) return Math.sqrt(nu * (1 / x - 1));
  const z = -normalQuantile(tail);
  const z2 = z * z;
  return z * (1 + (z2 + 1) / (4 * nu) + ((5 * z2 + 16) * z2 + 3) / (96 * nu * nu));
}

/** t with P(T > t) = tail: Newton on the logarithms of both, kept within a shrinking bracket. */
function quantileFromTail(shape: Shape, tail: number): number {
  let low = 0;
  let high = Infinity;
  let t = firstGuess(shape, tail);
  for (let i = 0; i < 200; i++) {
    const q = upperTail(shape, t);
    if (q > tail) low = t;
    else high = t;
    const logStep = q > 0 ? (Math.log(q / tail) * q) / (t * density(shape, t)) : -Infinity;
    let next = t * Math.exp(logStep);
    if (Math.abs(logStep) <= SETTLED) return next;
    if (!(next > low && next < high))
      next = high === Infinity ? 2 * t : low === 0 ? high / 2 : Math.sqrt(low * high);
    t = next;
  }
  return t;
}

/**
 * Quantile of Student's distribution, relative error about 1e-14; ν > 0 need not be whole, infinity is the normal
 * distribution.
 *
 * @throws {Refused} probability-out-of-range (not in 0 < p < 1), degrees-of-freedom (not above 0)
 */
export function studentQuantile(lowerTailProbability: number, degreesOfFreedom = Infinity): number {
  const p = lowerTailProbability;
  if (!(p > 0 && p < 1)) {
    refuse('probability-out-of-range', 'lowerTailProbability', `${p} does not lie between 0 and 1.`);
  }
  if (!(degreesOfFreedom > 0)) {
    refuse('degrees-of-freedom', 'degreesOfFreedom', `${degreesOfFreedom} is not above 0.`);
  }
  if (p === 0.5) return 0;
  const shape = shapeOf(degreesOfFreedom);
  const part = Math.abs(p - 0.5);
  const central = Math.min(0.25, centralPart(shape, seriesLimit(shape.nu)));
  const magnitude =
    part <= central ? quantileFromCentre(shape, part) : quantileFromTail(shape, p < 0.5 ? p : 1 - p);
  return p < 0.5 ? -magnitude : magnitude;
}
