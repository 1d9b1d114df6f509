import { dd, type DoubleDouble, multiply } from './double-double.js';
import { evaluateFinely, rootBounds, signChanges, type Terms } from './evaluate.js';
import { exactTerms, signAtTurningPoint } from './fine-decimal.js';
import { polish } from './polish.js';

/** A value this small against its terms is beyond double-double and is told with decimal.js. */
const DOUBTFUL = 1e-24;

const MOST_STEPS = 400;
/** From here on the bracket is halved. */
const PATIENCE = 60;

/** A member of the chain of derivatives. */
export interface Link extends Terms {
  /** Exponents that were factored out before each derivative, in order. */
  readonly pivots: readonly number[];
}

/** A root, and the member of the chain of which it is a simple root: the terms themselves, or a derivative for a multiple root. */
export interface IsolatedRoot {
  readonly z: DoubleDouble;
  readonly on: Link;
}

/**
 * Every positive root z of the terms, ascending, a multiple root once.
 *
 * Units: z is the growth factor of half a day. Domain: at least two terms with at least one change of sign; whole exponents.
 * Returns: the roots; complete, because between neighbouring roots of a derivative a function is monotone.
 * Throws: never.
 * Not guaranteed: two roots closer than about 1e-45 of each other count as one.
 * Complexity: (sign changes)² root searches in double-double at worst; windows with several changes are rare.
 * Source: Rolle's theorem with Descartes' rule: dividing by z^p with p between two exponents where the sign changes, then taking the
 * derivative by ln z, multiplies each amount by (exponent − p), which removes that change and adds none. The chain ends at
 * one change, which has exactly one root (ours; the induction is the textbook proof of Descartes' rule for real exponents).
 */
export function isolateRoots(terms: Terms): IsolatedRoot[] {
  const chain: Link[] = [{ ...terms, pivots: [] }];
  for (let changes = signChanges(terms.amounts); changes > 1; changes -= 1)
    chain.push(derive(chain[chain.length - 1]!));
  let roots: IsolatedRoot[] = [];
  for (let depth = chain.length - 1; depth >= 0; depth -= 1) roots = rootsBetween(chain, depth, roots);
  return roots;
}

/** The derivative by ln z of terms · z^−p, p half-way across the first change of sign; scaled so that products stay in range. */
function derive(link: Link): Link {
  const { exponents, amounts } = link;
  const count = amounts.length;
  let at = 1;
  while (amounts[at]! < 0 === amounts[at - 1]! < 0) at += 1;
  const pivot = (exponents[at - 1]! + exponents[at]!) / 2;
  const next = new Float64Array(count);
  const lows = new Float64Array(count);
  let largest = 0;
  for (let index = 0; index < count; index += 1) {
    const product = multiply({ hi: amounts[index]!, lo: link.lows?.[index] ?? 0 }, dd(exponents[index]! - pivot));
    next[index] = product.hi;
    lows[index] = product.lo;
    largest = Math.max(largest, Math.abs(product.hi));
  }
  // A power of two changes no digit.
  const scale = 2 ** -Math.floor(Math.log2(largest));
  for (let index = 0; index < count; index += 1) {
    next[index]! *= scale;
    lows[index]! *= scale;
  }
  return { exponents, amounts: next, lows, pivots: [...link.pivots, pivot] };
}

function rootsBetween(chain: readonly Link[], depth: number, turning: readonly IsolatedRoot[]): IsolatedRoot[] {
  const link = chain[depth]!;
  const bounds = rootBounds(link);
  const roots: IsolatedRoot[] = [];
  let low = Math.exp(bounds.low);
  let lowSign = Math.sign(link.amounts[link.amounts.length - 1]!);
  for (const point of turning) {
    const sign = signAt(chain, depth, point);
    if (sign === 0) roots.push(point);
    else if (lowSign !== 0 && sign !== lowSign) roots.push(rootWithin(link, low, point.z.hi, lowSign));
    low = point.z.hi;
    lowSign = sign;
  }
  const topSign = Math.sign(link.amounts[0]!);
  if (lowSign !== 0 && lowSign !== topSign) roots.push(rootWithin(link, low, Math.exp(bounds.high), lowSign));
  return roots;
}

function signAt(chain: readonly Link[], depth: number, point: IsolatedRoot): number {
  const link = chain[depth]!;
  const { value, size } = evaluateFinely(link, point.z);
  if (Math.abs(value.hi) > DOUBTFUL * size) return Math.sign(value.hi);
  return signAtTurningPoint(exactTerms(chain[0]!, link.pivots), exactTerms(chain[0]!, point.on.pivots), point.z);
}

/** The one root between two z at which the function's signs differ, by Newton in double-double kept within the bracket. */
function rootWithin(on: Link, from: number, to: number, lowSign: number): IsolatedRoot {
  let low = from;
  let high = to;
  let z = dd(Math.sqrt(low) * Math.sqrt(high));
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { value, slope } = evaluateFinely(on, z);
    if (value.hi === 0) return { z, on };
    if (Math.sign(value.hi) === lowSign) low = z.hi;
    else high = z.hi;
    const change = value.hi / slope.hi;
    const next = z.hi * (1 - change);
    const isWithin = next > low && next < high;
    if ((isWithin && Math.abs(change) < 1e-13) || high - low <= 4e-16 * high) break;
    z = dd(isWithin && step < PATIENCE ? next : Math.sqrt(low) * Math.sqrt(high));
  }
  const polished = polish(on, 1, z).z;
  return { z: polished.hi >= from && polished.hi <= to ? polished : z, on };
}
