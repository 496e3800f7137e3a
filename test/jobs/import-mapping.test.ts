import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createImportSite, type ImportSite } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
})
afterAll(() => site.close())

describe('a mapping', () => {
  const strange = 'Nummer,Was,Dick,Schnitt,Lang,Schaft\n'

  it('it is set, kept by the shop at the commit, and known the next time', async () => {
    const mapping = {
      Nummer: 'code',
      Was: 'form',
      Dick: { field: 'cuttingDiameterMm', unit: 'in' },
      Schnitt: 'lengthOfCutMm',
      Lang: 'overallLengthMm',
      Schaft: 'shankDiameterMm',
    }
    const first = await site.checked({
      kind: 'cutters',
      mapping,
      content: `${strange}M-1,square,1,30,100,25.4\n`,
    })
    expect(first).toMatchObject({ added: 1, rejectedCount: 0 })
    expect(first.columns.map(({ origin }) => origin)).toEqual(Array(6).fill('set'))
    const before = await site.checked({ kind: 'cutters', content: `${strange}M-2,square,1,30,100,25.4\n` })
    expect(before.columns.filter(({ origin }) => origin === 'kept')).toEqual([])
    await site.commit(first.id)
    await site.apply(first.id)
    const next = await site.checked({ kind: 'cutters', content: `${strange}M-2,square,1,30,100,25.4\n` })
    expect(next).toMatchObject({ added: 1, rejectedCount: 0 })
    expect(next.columns.map(({ origin }) => origin)).toEqual(Array(6).fill('kept'))
    expect(next.columns[2]).toMatchObject({ field: 'cuttingDiameterMm', unit: 'in' })
  })

  it('it can be changed after the check, and the file is checked again by it', async () => {
    const { id } = await site.checked({
      kind: 'cutters',
      content: 'Zeug,form,dc,apmx,oal,dmm\nN-1,square,6,12,57,6\n',
    })
    expect(await site.get(id)).toMatchObject({ rejectedCount: 1 })
    await site.recheck(id, { mapping: { Zeug: 'code' } })
    expect(await site.get(id)).toMatchObject({ state: 'reading', rejected: [] })
    await site.check(id)
    expect(await site.get(id)).toMatchObject({ state: 'checked', added: 1, rejectedCount: 0 })
  })

  it('it is refused at the upload where the file has no such column', async () => {
    const upload = { kind: 'cutters' as const, content: 'a,b\n1,2\n', mapping: { c: 'code' } }
    await expect(site.upload(upload)).rejects.toMatchObject({
      code: 'wrong-shape',
      options: { errors: [{ path: 'mapping.c', message: 'The file has no column “c”.' }] },
    })
  })
})

describe('the reject file', () => {
  it('it holds the rows as they stood, with the reason last, safe in a spreadsheet and readable again', async () => {
    const content = [
      'Code,Form,DC,APMX,OAL,DMM,Description,Note',
      '-X1,square,-5,12,57,6,"=HYPERLINK(""x"")",+1',
      '@X2,square,=1+1,12,57,6,"two ""words""",-3',
    ].join('\n')
    const { id } = await site.checked({ kind: 'cutters', content })
    expect(await site.rejects(id)).toBe(
      [
        'Code,Form,DC,APMX,OAL,DMM,Description,Note,Reason',
        `'-X1,square,-5,12,57,6,"'=HYPERLINK(""x"")",'+1,DC: A length can't be negative.`,
        `'@X2,square,'=1+1,12,57,6,"two ""words""",'-3,"DC: “=1+1” is not a length. Write it like 3.175 mm, 0.125 in or 1/8."`,
        '',
      ].join('\r\n'),
    )
    const corrected = (await site.rejects(id)).replace(',-5,', ',5,').replace(",'=1+1,", ',5,')
    const again = await site.committed({ kind: 'cutters', content: corrected })
    expect(again).toMatchObject({ added: 2, rejectedCount: 0 })
    expect(await site.db('items').where('code', '-X1').first()).toMatchObject({
      description: '=HYPERLINK("x")',
    })
  })
})
