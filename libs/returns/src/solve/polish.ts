import { add, divide, type DoubleDouble, multiply, negate } from './double-double.js';
import { evaluateFinely, type Terms } from './evaluate.js';

/** A root in z, the growth factor of half a day. */
export interface Root {
  readonly z: DoubleDouble;
  /** Relative error of the growth factor over the span that stays, as far as it can be told from the conditioning. */
  readonly error: number;
}

/** Rounding of one evaluation relative to the sum of its terms' sizes, with room for powers of long gaps. */
const FINE_NOISE = 1e-27;

/**
 * Takes a root known in double to double-double by Newton's method on the equation itself.
 *
 * Domain: start close to a simple root. Returns: z and the relative error left in z^spanHalfDays.
 * Not guaranteed: an interval; the error is the noise of the evaluation over its slope.
 * Complexity: two or three evaluations in double-double.
 */
export function polish(terms: Terms, spanHalfDays: number, start: DoubleDouble): Root {
  let z = start;
  let error = Infinity;
  for (let step = 0; step < 8; step += 1) {
    const { value, slope, size } = evaluateFinely(terms, z);
    const noise = Math.abs((size / slope.hi) * FINE_NOISE) * spanHalfDays;
    if (value.hi === 0) return { z, error: noise };
    const change = divide(value, slope);
    z = add(z, negate(multiply(z, change)));
    const moved = Math.abs(change.hi) * spanHalfDays;
    // Newton's error is of the order of the step's square, times a curvature that ill-conditioning magnifies.
    const curvature = 1 + Math.abs(size / slope.hi) * spanHalfDays;
    error = noise + moved * moved * curvature;
    if (error <= 2 * noise) break;
  }
  return { z, error };
}
