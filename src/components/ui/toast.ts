import type { ExternalToast, toast as sonnerToast } from 'sonner'

type Sonner = typeof sonnerToast
type Call = (sonner: Sonner) => void

let sonner: Sonner | null = null
let onFirst: (() => void) | null = null
const waiting: Call[] = []

function say(call: Call): void {
  if (sonner) {
    call(sonner)
    return
  }
  waiting.push(call)
  onFirst?.()
}

/** Short messages at the edge of the page. What is said before their code is there waits for it. */
export const toast = {
  success: (text: string, options?: ExternalToast) => say((to) => void to.success(text, options)),
  error: (text: string, options?: ExternalToast) => say((to) => void to.error(text, options)),
  warning: (text: string, options?: ExternalToast) => say((to) => void to.warning(text, options)),
  loading: (text: string, options?: ExternalToast) => say((to) => void to.loading(text, options)),
  dismiss: (id: string) => say((to) => void to.dismiss(id)),
}

/** The place where messages show is on the page. */
export function connectToasts(to: Sonner): void {
  sonner = to
  for (const call of waiting.splice(0)) call(to)
}

/** What to do should something be said before that place is there. */
export function onFirstToast(call: () => void): void {
  onFirst = call
  if (waiting.length > 0) call()
}
