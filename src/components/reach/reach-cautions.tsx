import { TriangleAlert } from 'lucide-react'

/** What no calculation can promise, where the danger is. */
export function ReachCautions() {
  return (
    <p className="text-ink flex gap-2 text-sm">
      <TriangleAlert aria-hidden="true" className="text-caution mt-0.5 size-4.5 shrink-0" />
      <span>
        A calculated reach is not a proven program. Check clearance on the machine before cutting. Follow the
        tool maker’s limits for speed and stick-out and the shop’s rules. Guarded spindle, eye protection.
      </span>
    </p>
  )
}
