/** A geometry that cannot be: the field to put the sentence beside, named as the caller named it, and the sentence. */
export interface GeometryProblem {
  path: (string | number)[]
  message: string
}

/** Lengths are rounded to this; comparisons of sums and halves allow as much. */
export const lengthToleranceMm = 1e-9

export function isMore(valueMm: number | null | undefined, limitMm: number | null | undefined): boolean {
  return valueMm != null && limitMm != null && valueMm > limitMm + lengthToleranceMm
}
