/** out += factor column over the reals from...to of a window whose first real in `out` is `at`. */
export function addScaled(
  out: Float64Array,
  at: number,
  column: Float64Array,
  from: number,
  to: number,
  factor: number,
): void {
  for (let k = from; k < to; k += 1) out[at + k] += factor * column[k];
}

/** The same with i times a real factor. */
export function addRotated(
  out: Float64Array,
  at: number,
  column: Float64Array,
  from: number,
  to: number,
  factor: number,
): void {
  for (let k = from; k < to; k += 2) {
    out[at + k] -= factor * column[k + 1];
    out[at + k + 1] += factor * column[k];
  }
}
