import { type FieldErrors, type FieldValues, type Resolver, set } from 'react-hook-form'
import type { CatalogueKind } from '@/core/stock/kinds'
import { createItemSchemas } from '@/schemas/create-item'
import type { FieldProblem } from '@/schemas/problem'
import type { ItemFormDefinition } from './item-form-definition'
import { type Manner, readTyped } from './typed-values'

/** What was typed, read once into mm, then asked of the schema the server asks too; each fault lands at its field. */
export function itemResolver<Row>(
  kind: CatalogueKind,
  definition: ItemFormDefinition<Row>,
  manner: Manner,
): Resolver<FieldValues, unknown, FieldValues> {
  return (values) => {
    const { body, problems } = readTyped(definition, values, manner)
    const checked = createItemSchemas[kind].safeParse(body)
    const unread = new Set(problems.map((problem) => problem.path))
    const issues = checked.success
      ? []
      : checked.error.issues
          .map((issue) => ({ path: issue.path.map(String).join('.'), message: issue.message }))
          .filter((issue) => !unread.has(issue.path))
    const all = [...problems, ...issues]
    return all.length === 0 ? { values: body, errors: {} } : { values: {}, errors: nestedErrors(all) }
  }
}

function nestedErrors(problems: FieldProblem[]): FieldErrors {
  const errors: FieldErrors = {}
  // The first fault of a field is the one to mend first.
  for (const { path, message } of problems.toReversed()) {
    // A fault of the segments as a whole stands beside them, never in place of a segment's own.
    set(errors, path === 'segments' ? 'segments.root' : path, { type: 'refused', message })
  }
  return errors
}
