'use client'

import { useCallback, useEffect, useRef } from 'react'
import useSWR from 'swr'
import { callApi } from '@/lib/api-client'
import type { ReachSearchBody, ReachSearchResponse } from '@/schemas/reach-search'

export const searchUrl = '/api/reach/search'

/**
 * The crib searched for one feature; nothing is asked while there is no request. A new search stops the
 * one before, and so does leaving the page.
 */
export function useToolSearch(request: ReachSearchBody | null) {
  const running = useRef<AbortController | null>(null)
  const { data, error, isValidating, mutate } = useSWR<ReachSearchResponse, Error>(
    request === null ? null : [searchUrl, JSON.stringify(request)],
    ([url, body]: [string, string]) => {
      running.current?.abort()
      const controller = new AbortController()
      running.current = controller
      return callApi<ReachSearchResponse>('POST', url, {
        body: JSON.parse(body),
        signal: controller.signal,
      })
    },
    { revalidateOnFocus: false, revalidateIfStale: true, shouldRetryOnError: false },
  )
  const isShown = useRef(true)
  useEffect(() => {
    isShown.current = true
    return () => {
      isShown.current = false
      // A moment later: React may take a page down and put it up again in one go, which is no leaving.
      setTimeout(() => {
        if (!isShown.current) running.current?.abort()
      })
    }
  }, [])
  const cancel = useCallback(() => running.current?.abort(), [])
  const isCancelled = error instanceof DOMException && error.name === 'AbortError'
  return {
    answer: data ?? null,
    error: isCancelled ? undefined : error,
    isCancelled: isCancelled && !isValidating,
    isSearching: isValidating,
    cancel,
    retry: () => mutate(),
  }
}
