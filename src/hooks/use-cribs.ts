import useSWR from 'swr'
import { getJson } from '@/lib/api-client'

export interface CribChoice {
  id: string
  code: string
  name: string
  /** Active members, who get its mail. */
  members: number
}

/** The shop's cribs. */
export function useCribs() {
  const { data, error, isLoading } = useSWR<{ rows: CribChoice[] }>('/api/cribs', getJson)
  return { data, error, isLoading }
}
