import { overlapToleranceMm, type ToolPart } from '@/core/outline/types'
import type { ReachAnswer } from '@/core/reach/types'
import { type SectionScene, topFaceMm } from './section-scene'

/** The parts that touch before the depth asked for is reached. */
export function touchingParts(
  scene: SectionScene,
  { firstTouch }: Pick<ReachAnswer, 'firstTouch'>,
): ToolPart[] {
  const { at } = scene
  const askedMm = topFaceMm(at) - (at.kind === 'wall' ? at.leadMm : 0)
  return firstTouch
    .filter(({ depthMm }) => depthMm !== null && depthMm < askedMm - overlapToleranceMm)
    .map(({ part }) => part)
}
