'use client'

import type { ReactNode } from 'react'
import { toast } from '@/components/ui/toast'
import { callApi } from '@/lib/api-client'
import { Button } from '../ui/button'

export function SignOutButton({ label, className }: { label: ReactNode; className?: string }) {
  async function handleSignOut() {
    try {
      await callApi('DELETE', '/api/session')
      // A full load, so that nothing of this person stays in memory.
      window.location.assign('/sign-in')
    } catch (error) {
      toast.error(error instanceof Error ? error.message : 'Signing out failed.')
    }
  }
  return (
    <Button
      variant="quiet"
      size="compact"
      className={className}
      onClick={handleSignOut}
      aria-label="Sign out"
    >
      {label}
    </Button>
  )
}
