import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aBathWater, aDraft, aProduct, aSchool, bathFields, signDraft } from '../builders/an-order.ts'
import { pageCount, textOf } from '../pdf/support/poppler.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let owner: pg.Client
let fields: ReturnType<typeof bathFields>
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  const tank = await aBathWater(api, 'QT-3')
  const school = await aSchool(api, tank.id, 1)
  const product = await aProduct(api, {})
  fields = bathFields({
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: product.id,
    lotId: product.lotId,
  })
})
afterAll(async () => {
  await owner.end()
  await api.stop()
})

async function aSigned() {
  const draft = await aDraft(api, fields)
  const signed = await signDraft(api, draft)
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  return draft
}

const flat = (bytes: Uint8Array) => textOf(bytes).replaceAll(/\s+/g, ' ')
async function read(number: string) {
  const technician = await api.as('technician')
  const at = `/api/orders/${number}`
  const { body: order } = await technician.agent.get(at).expect(200)
  const { body: sheet } = await technician.agent.get(`${at}/doses/1`).expect(200)
  return { order, sheet, technician, at }
}

// the amount is 2,181.4 L × 2 mg/L = 4.36 g
const another = 'not the text that was signed'

describe('a signed order beside whose intact text something was changed', () => {
  it.each([
    ['the amount', 'amount_entered_value = 43.6'],
    ['the number of doses', 'doses = 3'],
    ['the contact time, the net volume', 'contact_minutes = 7, net_volume_litres = 9'],
  ])('says that it was %s, and shows an amount as that of the text alone', async (names, set) => {
    const { id, number } = await aSigned()
    await owner.query(`UPDATE order_versions SET ${set} WHERE order_id = $1`, [id])
    const { order, sheet, technician, at } = await read(number)
    const [version] = order.versions
    expect(version.signature).toMatchObject({ state: 'broken', fault: { what: 'entries' } })
    expect(version.content.amount.text).toBe('4.36\u00a0g')

    const paper = await fetchPdf(technician, `${at}/print`)
    const order1 = flat(paper)
    expect(order1).toContain('The signed text is as it was signed. What is stored beside it was changed:')
    for (const name of names.split(', ')) expect(order1).toContain(name)
    expect(order1).toContain(
      'From the signed text, which was checked and is as it was signed. Do not dose. 4.36 g',
    )
    expect(order1).not.toContain(another)
    for (let page = 1; page <= pageCount(paper); page++)
      expect(textOf(paper, page).replaceAll(/\s+/g, ' ')).toContain(
        'Record check failed: what is stored beside the signed text was changed. Do not act on this page.',
      )

    // at the tank nobody needs the figure: no dose may be given
    expect(sheet).toMatchObject({
      mayStart: false,
      record: 'broken',
      recordFault: { what: 'entries' },
      signedAmountText: null,
      amountNowText: null,
      amountNow: null,
      working: [],
      roundingText: null,
    })
    expect(sheet.why[0]).toContain('What is stored beside it was changed')
    expect(JSON.stringify(sheet.why)).not.toMatch(/4\.36|43\.6/)
    const bath = flat(await fetchPdf(technician, `${at}/doses/1/print`))
    expect(bath).toContain('What is stored beside it was changed')
    expect(bath).toContain('Do not dose; tell a veterinarian and the administrator.')
    expect(bath).not.toContain(another)
    expect(bath).not.toMatch(/4\.36|43\.6/)
  })
})

describe('an order whose text may be that of another version', () => {
  it('shows none of its figures, and says why', async () => {
    const { id, number } = await aSigned()
    await owner.query(`UPDATE order_versions SET version_no = 2 WHERE order_id = $1`, [id])
    const { order, sheet, technician, at } = await read(number)
    expect(order).toMatchObject({ amountText: null, targetText: null })
    expect(order.versions).toMatchObject([{ content: null, signature: { fault: { what: 'whose' } } }])
    expect(sheet).toMatchObject({ signedAmountText: null, amountNow: null, targetText: '' })
    for (const path of [`${at}/print`, `${at}/doses/1/print`]) {
      const paper = flat(await fetchPdf(technician, path))
      expect(paper).toContain('a signature is missing, or the text is that of another record')
      expect(paper).not.toContain(another)
      expect(paper).not.toMatch(/4\.36|2 mg\/L/)
    }
  })
})

describe('an order whose text was changed', () => {
  it('says that, and shows none of its figures', async () => {
    const { number } = await aSigned()
    await owner.query(
      `UPDATE signed_texts SET text = replace(text, '"stopIf"', '"stopIF"') WHERE subject_label = $1`,
      [number],
    )
    const { order, technician, at } = await read(number)
    expect(order.versions).toMatchObject([{ content: null, signature: { fault: { what: 'text' } } }])
    const paper = flat(await fetchPdf(technician, `${at}/print`))
    expect(paper).toContain('This is not the text that was signed, or it can’t be read any more.')
    expect(paper).not.toMatch(/4\.36/)
  })
})
