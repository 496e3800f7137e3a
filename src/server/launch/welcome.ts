import { networkInterfaces } from 'node:os'
import type { Env } from '../env'

const everyInterface = ['0.0.0.0', '::']

/** The host at which this computer itself reaches a server that listens on `host`. */
export function reachableHost(host: string): string {
  if (everyInterface.includes(host)) return '127.0.0.1'
  return host.includes(':') ? `[${host}]` : host
}

/** What somebody who has just started Leadline wants to know. */
export function welcome(settings: Env, accounts: string): string {
  const lines = ['', `Leadline is running at ${settings.PUBLIC_URL ?? localAddress(settings)}`]
  if (everyInterface.includes(settings.HOST) && !settings.PUBLIC_URL) {
    lines.push(...networkAddresses().map((address) => `  and at http://${address}:${settings.PORT}`))
  }
  if (settings.isCookieSecure && !settings.PUBLIC_URL) {
    lines.push(
      'Other computers can sign in over https only: README says how to put TLS in front (PUBLIC_URL).',
    )
  }
  if (accounts) lines.push('', accounts)
  lines.push('', 'Ctrl-C stops it.', '')
  return lines.join('\n')
}

export const demoAccounts = [
  'Sign in to the demo shop with the password leadline-demo as',
  '  admin@leadline.example      the administrator',
  '  crib@leadline.example       the crib manager',
  '  machinist@leadline.example  a machinist',
  '  estimator@leadline.example  an estimator',
].join('\n')

/** What db/seeds/demo-shop.ts says tells whether the demo accounts exist: a shop of its own is left alone. */
export function isDemoThere(told: string): boolean {
  return /^The demo shop is (?:loaded|here)/.test(told)
}

export function localAddress({ HOST, PORT }: Pick<Env, 'HOST' | 'PORT'>): string {
  return `http://${reachableHost(HOST)}:${PORT}`
}

function networkAddresses(): string[] {
  return Object.values(networkInterfaces())
    .flatMap((addresses) => addresses ?? [])
    .filter((address) => address.family === 'IPv4' && !address.internal)
    .map((address) => address.address)
}
