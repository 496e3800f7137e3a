import type { FieldValues } from 'react-hook-form'
import type { ItemFormDefinition } from './item-form-definition'
import { formFields, type TypedSegment } from './typed-values'
import { valueAt } from './value-at'

/** A field that someone else changed meanwhile: as it was, as it is now, as it stands in the form. */
export interface StaleField {
  path: string
  label: string
  before: string
  theirs: string
  mine: string
}

/** What changed between the row the form opened with and the row as it is now. */
export function staleFields(
  definition: Pick<ItemFormDefinition<never>, 'groups' | 'segments' | 'blank'>,
  before: FieldValues,
  theirs: FieldValues,
  mine: FieldValues,
): StaleField[] {
  return comparedPaths(definition)
    .map(({ path, label }) => ({
      path,
      label,
      before: shownText(definition, path, before),
      theirs: shownText(definition, path, theirs),
      mine: shownText(definition, path, mine),
    }))
    .filter((field) => field.before !== field.theirs)
}

/** Theirs, with what was changed here laid over it: what nobody touched here is not thrown back. */
export function mergedValues(
  definition: Pick<ItemFormDefinition<never>, 'groups' | 'segments' | 'blank'>,
  before: FieldValues,
  theirs: FieldValues,
  mine: FieldValues,
): { path: string; value: unknown }[] {
  return comparedPaths(definition).map(({ path }) => {
    const isMine = shownText(definition, path, before) !== shownText(definition, path, mine)
    return { path, value: valueAt(isMine ? mine : theirs, path) }
  })
}

function comparedPaths(definition: Pick<ItemFormDefinition<never>, 'groups' | 'segments' | 'blank'>) {
  const fields = formFields(definition).map(({ path, label }) => ({ path, label }))
  return definition.segments ? [...fields, { path: 'segments', label: 'Outline' }] : fields
}

function shownText(
  definition: Pick<ItemFormDefinition<never>, 'groups' | 'segments' | 'blank'>,
  path: string,
  values: FieldValues,
): string {
  const value: unknown = valueAt(values, path)
  if (path === 'segments' && Array.isArray(value))
    return (value as TypedSegment[])
      .map(
        (segment) =>
          `${segment.part} ${segment.lengthMm} × ${segment.noseDiameterMm}/${segment.spindleDiameterMm}`,
      )
      .join(', ')
  const field = formFields(definition).find((candidate) => candidate.path === path)
  const text = String(value ?? '').trim()
  return field?.options?.find((option) => option.value === text)?.label ?? text
}
