import type { Role } from '@/core/policies/permissions'
import type { LengthUnit } from '@/core/units/length-unit'

/** Who asks: the signed-in person, as every service sees them. */
export interface Actor {
  id: string
  name: string
  email: string
  role: Role
  /** The location that stands for this person's own hands. */
  locationId: string
  /** Null follows the shop's. */
  lengthUnit: LengthUnit | null
  homeCribId: string | null
}
