import '@fontsource/source-sans-3/400.css'
import '@fontsource/source-sans-3/600.css'
import '@fontsource/source-sans-3/700.css'
import './globals.css'
import type { Metadata, Viewport } from 'next'
import { connection } from 'next/server'
import type { ReactNode } from 'react'

export const metadata: Metadata = {
  title: { default: 'Leadline', template: '%s · Leadline' },
  description: 'Tool crib, reach and stick-out for machine shops',
}

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#eff3f5' },
    { media: '(prefers-color-scheme: dark)', color: '#0f1418' },
  ],
}

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Every page carries a nonce of its own request, so none is made ahead of it.
  await connection()
  return (
    <html lang="en">
      <body>{children}</body>
    </html>
  )
}
