import useSWR, { useSWRConfig } from 'swr'
import { callApi, getJson } from '@/lib/api-client'
import type { CribMember } from '@/schemas/crib-member'

/** Everyone who may be a member of a crib, and whether they are. */
export function useCribMembers(cribId: string) {
  const { mutate: mutateAny } = useSWRConfig()
  const { data, error, mutate } = useSWR<{ rows: CribMember[] }>(`/api/cribs/${cribId}/members`, getJson)

  /** Makes a person a member or none; throws what stands against it. */
  async function setMember(userId: string, isMember: boolean): Promise<void> {
    try {
      await callApi(isMember ? 'PUT' : 'DELETE', `/api/cribs/${cribId}/members/${userId}`)
    } finally {
      await Promise.all([mutate(), mutateAny('/api/cribs')])
    }
  }

  return { data, error, refresh: mutate, setMember }
}
