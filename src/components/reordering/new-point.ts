import { useState } from 'react'
import { useDebounced } from '@/components/reach/use-debounced'
import { useCribs } from '@/hooks/use-cribs'
import { useItemStock } from '@/hooks/use-item'
import { type ItemOfCode, useItemOfCode } from '@/hooks/use-reorder-points'
import { likelyCribId, piecesByCrib } from './crib-stock'

interface Faults {
  code?: string
  crib?: string
}

/** What a new reorder point is of: the item typed and the crib it most likely is for, until one is chosen. */
export function useNewPoint(known: ItemOfCode | undefined, lookedAtId: string | undefined) {
  const [code, setCode] = useState('')
  const [chosen, setChosen] = useState<string | null>(null)
  const [faults, setFaults] = useState<Faults>({})
  const { data } = useCribs()
  const found = useItemOfCode(useDebounced(known ? '' : code.trim(), restMs))
  const { stock } = useItemStock(known?.id ?? found?.id ?? null)
  const cribs = data?.rows ?? []
  const cribId = chosen ?? likelyCribId(cribs, stock ? piecesByCrib(stock) : [], lookedAtId)

  /** Whether both are named; what is missing is said beside its field. */
  function check(): boolean {
    const missing: Faults = {}
    if (!known && code.trim() === '') missing.code = 'Give the code of the item.'
    if (cribId === '') missing.crib = 'Choose the crib.'
    setFaults(missing)
    return Object.keys(missing).length === 0
  }

  const crib = cribs.find(({ id }) => id === cribId)
  return { code, setCode, cribId, crib, cribs, setCribId: setChosen, stock, faults, setFaults, check }
}

const restMs = 250

export type NewPoint = ReturnType<typeof useNewPoint>
