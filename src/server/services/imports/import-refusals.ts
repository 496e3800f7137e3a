import { AppError } from '@/lib/app-error'

export function noSuchImport(): AppError {
  return new AppError('not-found', 'There is no such import.')
}

export function alreadyCommitted(): AppError {
  return new AppError(
    'import-already-committed',
    'This import is committed: what it brought is in the catalogue.',
  )
}
