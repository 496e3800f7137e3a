import { ButtonLink } from '@/components/ui/button'
import { StateSentence } from '@/components/ui/state-sentence'

export default function NotFound() {
  return (
    <main>
      <StateSentence
        isHeading
        sentence="There is nothing at this address. It may have been archived or never existed."
      >
        <ButtonLink href="/reach">To the reach check</ButtonLink>
        <ButtonLink href="/cutters">To the cutters</ButtonLink>
      </StateSentence>
    </main>
  )
}
