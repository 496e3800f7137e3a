import { StateSentence } from '@/components/ui/state-sentence'

export default function Loading() {
  return <StateSentence sentence="Loading …" />
}
