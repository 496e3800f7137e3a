import type { ReachMessage } from '@/core/reach/message-codes'
import type { LengthUnit } from '@/core/units/length-unit'
import { type MessageKind, messageKinds, messageSentence } from '@/lib/reach-sentences'
import { Notice } from '../ui/notice'

export interface ReachMessagesProps {
  messages: readonly ReachMessage[]
  unit: LengthUnit
}

/** What stops it, what is to be known, and what was taken for granted. */
export function ReachMessages({ messages, unit }: ReachMessagesProps) {
  const ofKind = (kind: MessageKind) =>
    messages
      .filter(({ code }) => messageKinds[code] === kind)
      .map((message) => messageSentence(message, unit))
  const [stops, cautions, assumed] = [ofKind('stops'), ofKind('caution'), ofKind('assumed')]
  return (
    <section
      aria-labelledby="reach-messages"
      className="flex flex-col gap-2 print:block print:columns-2 print:[&_svg]:hidden"
    >
      <h2 id="reach-messages" className="text-lg">
        To know
      </h2>
      {stops.map((text) => (
        <Notice key={text} kind="collision">
          {text}
        </Notice>
      ))}
      {cautions.map((text) => (
        <Notice key={text} kind="caution">
          {text}
        </Notice>
      ))}
      {assumed.length > 0 ? (
        <ul className="text-ink-soft flex list-disc flex-col gap-1 pl-5 text-[0.9375rem] print:block">
          {assumed.map((text) => (
            <li key={text} className="break-inside-avoid">
              {text}
            </li>
          ))}
        </ul>
      ) : null}
    </section>
  )
}
