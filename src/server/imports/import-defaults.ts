import { AppError } from '@/lib/app-error'
import { defaultableFields, type ImportKind } from '@/schemas/import-fields'
import type { ImportDefaults } from '@/schemas/import-mapping'
import type { FieldProblem } from '@/schemas/problem'
import { enumToDb } from '../db/enum-case'
import type { FlatRecord } from './flat-values'
import { formNamed } from './trade-words'

/** Refuses a field that is not said for all rows, and a form nobody knows; a crib is looked for with the rows. */
export function checkDefaults(kind: ImportKind, defaults: ImportDefaults): void {
  const errors = Object.entries(defaults).flatMap(([field, value]): FieldProblem[] => {
    const path = `defaults.${field}`
    const known = defaultableFields[kind]
    if (!known.some((one) => one === field)) {
      const which = known.length > 0 ? `Only ${known.join(', ')}` : 'Nothing'
      return [{ path, message: `${which} can be given for all rows of ${kind}.` }]
    }
    if (value.trim() === '') return [{ path, message: 'Give a value, or leave the field out.' }]
    return field === 'form' && !formNamed(value) ? [{ path, message: `“${value}” is not a form.` }] : []
  })
  if (errors.length > 0) throw new AppError('wrong-shape', errors[0]?.message ?? '', { errors })
}

/** What rows that say nothing of it are given, by the columns of the database. */
export function defaultRecord({ form, crib }: ImportDefaults): FlatRecord {
  const known = form === undefined ? undefined : formNamed(form)
  return { ...(known ? { form: enumToDb(known) } : {}), ...(crib === undefined ? {} : { crib: crib.trim() }) }
}
