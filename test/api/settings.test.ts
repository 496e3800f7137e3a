import { describe, expect, it } from 'vitest'
import { faultPaths, signedInAs } from '../support/api'

describe('the shop’s settings', () => {
  it('are seen by everyone and changed by an admin', async () => {
    const machinist = await signedInAs('machinist')
    const admin = await signedInAs('admin')
    const { body: before } = await machinist.get('/api/settings')
    expect(before.reach).toMatchObject({
      shankClearanceMm: expect.any(Number),
      holderClearanceMm: expect.any(Number),
    })
    expect(before).toMatchObject({
      cutting: { radialForceShare: 0.4, stickOutCautionRatio: 4, stickOutLimitRatio: 8 },
      measuringToleranceMm: 0.05,
    })
    const changed = await admin.patch('/api/settings', { version: before.version, shopName: before.shopName })
    expect(changed.status).toBe(200)
    expect(changed.body).toEqual(before)
  })

  it.each([
    [{ reach: { shankClearanceMm: -0.1 } }, 'reach.shankClearanceMm', 422],
    [{ reach: { stickOutStepMm: 0 } }, 'reach.stickOutStepMm', 422],
    [{ reach: { fluteStiffnessRatio: 1.2 } }, 'reach.fluteStiffnessRatio', 422],
    [{ cutting: { radialForceShare: -0.1 } }, 'cutting.radialForceShare', 422],
    [{ cutting: { stickOutCautionRatio: 9 } }, 'cutting.stickOutLimitRatio', 422],
    [{ cutting: { stickOutCautionRatio: 0 } }, 'cutting.stickOutCautionRatio', 422],
    [{ measuringToleranceMm: -1 }, 'measuringToleranceMm', 422],
    [{ reach: { holderClearanceMm: 'wide' } }, 'reach.holderClearanceMm', 400],
    [{ currency: 'euros' }, 'currency', 400],
    [{ lengthUnit: 'furlong' }, 'lengthUnit', 400],
  ])('refuse %j beside its field', async (change, path, status) => {
    const admin = await signedInAs('admin')
    const { body } = await admin.get('/api/settings')
    const answer = await admin.patch('/api/settings', { version: body.version, ...change })
    expect(answer.status).toBe(status)
    expect(faultPaths(answer)).toEqual([path])
  })

  it('refuse a stale version and answer what they are', async () => {
    const admin = await signedInAs('admin')
    const { body } = await admin.get('/api/settings')
    const answer = await admin.patch('/api/settings', { version: body.version + 100, decimalComma: true })
    expect(answer.status).toBe(409)
    expect(answer.body.current).toMatchObject({ decimalComma: body.decimalComma })
  })
})

describe('one’s own unit', () => {
  it('is kept with the person', async () => {
    const admin = await signedInAs('admin')
    const answer = await admin.patch('/api/me', { lengthUnit: 'in' })
    expect(answer.body).toMatchObject({ lengthUnit: 'in', role: 'admin' })
    expect((await admin.patch('/api/me', { lengthUnit: null })).body.lengthUnit).toBeNull()
  })

  it('is mm or inch', async () => {
    const admin = await signedInAs('admin')
    const answer = await admin.patch('/api/me', { lengthUnit: 'cubit' })
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual(['lengthUnit'])
  })
})
