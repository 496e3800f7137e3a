import type { toast as sonnerToast } from 'sonner'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'

type Area = typeof import('./toast')
let area: Area

beforeEach(async () => {
  vi.resetModules()
  area = await import('./toast')
})
afterEach(() => vi.restoreAllMocks())

function listener() {
  const heard: string[] = []
  const say = (kind: string) => (text: unknown) => heard.push(`${kind}: ${String(text)}`)
  const sonner = { success: say('success'), error: say('error'), dismiss: say('dismiss') }
  return { heard, sonner: sonner as unknown as typeof sonnerToast }
}

test('it loses no message that is said before there is a place for it, and keeps their order', () => {
  area.toast.error('Not saved.')
  area.toast.success('Saved.')
  const { heard, sonner } = listener()
  area.connectToasts(sonner)
  area.toast.dismiss('wait')
  expect(heard).toEqual(['error: Not saved.', 'success: Saved.', 'dismiss: wait'])
})

test('it asks for the place at each message until it is there, and no more after', () => {
  const load = vi.fn()
  area.onFirstToast(load)
  expect(load).not.toHaveBeenCalled()
  area.toast.error('One')
  area.toast.error('Two')
  expect(load).toHaveBeenCalledTimes(2)
  area.connectToasts(listener().sonner)
  area.toast.success('Three')
  expect(load).toHaveBeenCalledTimes(2)
})

test('it asks for the place at once where something was said before anybody could be asked', () => {
  area.toast.error('Early')
  const load = vi.fn()
  area.onFirstToast(load)
  expect(load).toHaveBeenCalledTimes(1)
})
