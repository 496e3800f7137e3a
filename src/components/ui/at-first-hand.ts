const signs = ['pointermove', 'pointerdown', 'keydown'] as const

/**
 * Calls once, at the first sign that somebody is at the page: a moved or pressed pointer, or a key. What is only needed
 * to act may be loaded then, and is there before the act is done.
 */
export function atFirstHand(call: () => void): void {
  if (typeof window === 'undefined') return
  const handle = () => {
    for (const sign of signs) window.removeEventListener(sign, handle, true)
    call()
  }
  for (const sign of signs) window.addEventListener(sign, handle, { capture: true, passive: true })
}
