/**
 * The least index in 0…count−1 at which a test holds, where it holds from some index on; `count` if nowhere.
 * Starts at a guess and doubles its steps away from it, so that a good guess costs two tests.
 */
export function leastIndex(count: number, holds: (index: number) => boolean, guess = count >> 1): number {
  if (count === 0) return 0;
  // invariant: fails at `low`, holds at `high` (−1 and count stand for "before" and "never")
  let low = -1;
  let high = count;
  let at = Math.min(Math.max(guess, 0), count - 1);
  let step = 1;
  if (holds(at)) {
    high = at;
    while (high > 0) {
      at = Math.max(high - step, 0);
      if (!holds(at)) {
        low = at;
        break;
      }
      high = at;
      step *= 2;
    }
  } else {
    low = at;
    while (low < count - 1) {
      at = Math.min(low + step, count - 1);
      if (holds(at)) {
        high = at;
        break;
      }
      low = at;
      step *= 2;
    }
  }
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (holds(middle)) high = middle;
    else low = middle;
  }
  return high;
}
