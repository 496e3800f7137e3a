/**
 * An input the core refuses, with a stable code, the place it was given and a sentence that can be shown.
 *
 * `path` names the field as the caller named it (`cutter.cornerRadiusMm`), so an edge can put the sentence beside it.
 */
export class CoreInputError extends Error {
  override readonly name = 'CoreInputError'

  constructor(
    readonly code: string,
    readonly path: string,
    message: string,
  ) {
    super(message)
  }
}
