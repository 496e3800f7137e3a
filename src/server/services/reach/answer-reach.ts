import { reachAnswer } from '@/core/reach/reach-answer'
import { messageSentence } from '@/lib/reach-sentences'
import type { ReachRequestBody, ReachResponse } from '@/schemas/reach'
import { db } from '../../db/connection'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { findReachTooling } from './find-reach-tooling'

/** Does it reach: the same calculation the page makes, with the tools read from the crib where they are named. */
export async function answerReach(body: ReachRequestBody): Promise<ReachResponse> {
  const [tooling, settings] = await Promise.all([findReachTooling(db(), body), readShopSettings(db())])
  const { reach } = settings
  const answer = reachAnswer({
    ...tooling,
    feature: body.feature,
    stickOutMm: body.stickOutMm,
    sideLoadN: body.sideLoadN,
    clearances: {
      shankMm: body.clearances?.shankMm ?? reach.shankClearanceMm,
      holderMm: body.clearances?.holderMm ?? reach.holderClearanceMm,
    },
    settings: reach,
  })
  const messages = answer.messages.map((message) => ({
    code: message.code,
    text: messageSentence(message, 'mm'),
  }))
  return { ...answer, messages }
}
