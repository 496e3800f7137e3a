import { conditionNames } from '@/components/catalogue/stock-words'
import type { MergePreview as Preview } from '@/schemas/duplicate'
import { heldPlace, type MergedCodes, namedTags, reorderingSentences } from './merge-sentences'

/** All that a merge would do, before it is pressed. */
export function MergePreview({ preview, codes }: { preview: Preview; codes: MergedCodes }) {
  const { held, tagsNowhere, cribs, earlierCodes } = preview
  return (
    <div className="flex flex-col gap-4">
      <section className="flex flex-col gap-1">
        <h3 className="font-semibold">The pieces</h3>
        {held.length > 0 ? (
          <HeldTable held={held} codes={codes} />
        ) : (
          <p>There is no piece of {codes.merged} in the shop.</p>
        )}
        {tagsNowhere.length > 0 ? (
          <p>
            Nowhere in the shop now, and of {codes.kept} from then on: {namedTags(tagsNowhere)}.
          </p>
        ) : null}
      </section>
      <section className="flex flex-col gap-1">
        <h3 className="font-semibold">Reorder points and alerts</h3>
        {cribs.length > 0 ? (
          <ul className="flex list-disc flex-col gap-1 pl-5">
            {reorderingSentences(cribs, codes).map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        ) : (
          <p>Neither has a reorder point.</p>
        )}
      </section>
      <section className="flex flex-col gap-1">
        <h3 className="font-semibold">The codes</h3>
        <ul className="flex list-disc flex-col gap-1 pl-5">
          <li>{codes.merged} is archived; what happened to it stays readable under its code.</li>
          <li>
            Whoever searches for {[codes.merged, ...earlierCodes].join(', ')} finds {codes.kept}.
          </li>
          <li>{codes.kept} keeps its own maker, number, description and cost.</li>
        </ul>
      </section>
    </div>
  )
}

function HeldTable({ held, codes }: { held: Preview['held']; codes: MergedCodes }) {
  const total = held.reduce((sum, { quantity }) => sum + quantity, 0)
  const cell = 'py-1 pr-3'
  return (
    <table className="w-full text-left text-[0.9375rem]">
      <caption className="pb-1 text-left">
        {total === 1 ? '1 piece counts' : `${total} pieces count`} as {codes.kept} from then on, right where{' '}
        {total === 1 ? 'it is' : 'they are'}.
      </caption>
      <thead>
        <tr className="border-ink text-ink-soft border-b text-sm">
          <th scope="col" className={`${cell} font-normal`}>
            Where
          </th>
          <th scope="col" className={`${cell} font-normal`}>
            Condition
          </th>
          <th scope="col" className="py-1 text-right font-normal">
            Pieces
          </th>
        </tr>
      </thead>
      <tbody>
        {held.map((place) => (
          <tr
            key={`${place.locationId} ${place.condition}`}
            className="border-hairline border-b align-baseline"
          >
            <th scope="row" className={`${cell} font-normal`}>
              {heldPlace(place)}
              {place.tags.length > 0 ? (
                <span className="text-ink-soft block text-sm">{namedTags(place.tags)}</span>
              ) : null}
            </th>
            <td className={cell}>{conditionNames[place.condition]}</td>
            <td className="py-1 text-right">{place.quantity}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
