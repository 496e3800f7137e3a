/** Why a file as a whole cannot be read, as a sentence for the one who brought it. */
export class ImportFileError extends Error {
  override readonly name = 'ImportFileError'
}
