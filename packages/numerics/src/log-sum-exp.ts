/** log of the sum of exponentials; -Infinity for an empty list. Loses the maximum before exponentiating. */
export function logSumExp(values: ArrayLike<number>): number {
  let largest = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < values.length; i += 1) largest = Math.max(largest, values[i]);
  if (!Number.isFinite(largest)) return largest;
  let sum = 0;
  for (let i = 0; i < values.length; i += 1) sum += Math.exp(values[i] - largest);
  return largest + Math.log(sum);
}
