import type { Role } from '@/core/policies/permissions'

export const roleNames: Record<Role, string> = {
  machinist: 'Machinist',
  estimator: 'Estimator',
  cribManager: 'Crib manager',
  admin: 'Admin',
}

/** What each role is for, in a few words, beside the choice. */
export const roleNotes: Record<Role, string> = {
  machinist: 'checks reach; issues and returns tools',
  estimator: 'checks reach; sees costs',
  cribManager: 'keeps the catalogue, the places and the count; sees costs',
  admin: 'all of it, and people and settings',
}
