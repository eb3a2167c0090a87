import { minor, type Minor } from "./money";

/**
 * The nearest sum that coins can pay, halves up: 1.02 is 1.00 and 1.03 is 1.05 where the smallest coin is 0.05. Cash only,
 * after tax, on the total; money given back is rounded like money taken.
 *
 * @param step the smallest coin in minor units, 1 where every sum can be paid.
 */
export function roundToCash(amount: number, step: number): Minor {
  if (!Number.isSafeInteger(step) || step < 1) throw new RangeError(`The smallest coin is a whole number of minor units, not ${step}`);
  const rounded = Math.floor((2 * Math.abs(amount) + step) / (2 * step)) * step;
  return minor(amount < 0 ? -rounded : rounded);
}
