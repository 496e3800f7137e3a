import type { Metadata } from 'next'
import { ButtonLink } from '@/components/ui/button'
import { StateSentence } from '@/components/ui/state-sentence'

export const metadata: Metadata = { title: 'Not allowed' }

export default function NotAllowedPage() {
  return (
    <StateSentence isHeading sentence="Your role does not include that page. An admin can change your role.">
      <ButtonLink href="/reach">Check a reach instead</ButtonLink>
    </StateSentence>
  )
}
