import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { RequestContext } from '../../server/platform/http/request-context.ts'
import { password, startApi } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let owner: pg.Client
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
})
afterAll(async () => {
  await owner.end()
  await api.stop()
})

const contextOf = (person: TestPerson, role: 'veterinarian' | 'technician'): RequestContext => ({
  actor: { personId: person.id, printedName: person.printedName, roles: [role] },
  requestId: 'test',
})

async function signSomething(): Promise<{ id: string; hash: string }> {
  const vet = await api.as('veterinarian')
  const { parts, signing } = api.composition
  const context = contextOf(vet, 'veterinarian')
  const signatory = await signing.service.confirmSignatory(context, 'order.sign', password, parts.clock.now())
  return parts.transactions.inTransaction(context, async (tx) => {
    const sealed = await signing.service.seal(tx, {
      signatory,
      subject: { kind: 'order', id: parts.ids.next(), label: 'TO-0001' },
      meaning: 'author of this order',
      content: { amount: '0.44 g', note: 'µ ° é' },
    })
    return { id: sealed.id, hash: sealed.hash }
  })
}

describe('signing', () => {
  it('shows name, licence, day, zone and meaning, and finds the text intact', async () => {
    const { id, hash } = await signSomething()
    const { block, content } = await api.composition.signing.service.readSealed(id, api.clock.now())
    expect(content).toEqual({ amount: '0.44 g', note: 'µ ° é' })
    expect(block).toMatchObject({
      printedName: 'Test veterinarian',
      licence: { jurisdiction: 'Norrell Sound', number: 'VL-20417', validUntil: '2027-09-30' },
      meaning: 'author of this order',
      signedAt: '2026-12-01T18:20:00.000Z',
      signedOn: '2026-12-01',
      zone: 'America/Halifax',
      hash,
      state: 'intact',
    })
    const chain = await owner.query(
      `SELECT 1 FROM audit_entries WHERE action = 'signature.make' AND text LIKE $1`,
      [`%${hash}%`],
    )
    expect(chain.rowCount).toBe(1)
  })

  it('is shown as broken when the text was changed in the database, even together with its hash', async () => {
    const { id } = await signSomething()
    await owner.query(`UPDATE signed_texts SET text = replace(text, '0.44', '4.4') WHERE id = $1`, [id])
    expect((await api.composition.signing.service.readSealed(id, api.clock.now())).block.state).toBe('broken')
    await owner.query(
      `UPDATE signed_texts SET hash = encode(sha256(convert_to(text, 'UTF8')), 'hex') WHERE id = $1`,
      [id],
    )
    expect((await api.composition.signing.service.readSealed(id, api.clock.now())).block.state).toBe('broken')
    await owner.query(`UPDATE signed_texts SET text = 'no JSON' WHERE id = $1`, [id])
    expect((await api.composition.signing.service.readSealed(id, api.clock.now())).block.state).toBe('broken')
  })

  it('says so when the signature was made by another installation', async () => {
    const { id } = await signSomething()
    await owner.query(`UPDATE signed_texts SET key_id = '0123456789abcdef' WHERE id = $1`, [id])
    expect((await api.composition.signing.service.readSealed(id, api.clock.now())).block.state).toBe(
      'unknown-key',
    )
  })

  it('asks for the signer’s own password, and locks after five wrong ones', async () => {
    const vet = await api.person({
      email: 'sign@harrow-point.example',
      printedName: 'Sig',
      roles: ['veterinarian'],
    })
    const { people, parts, signing } = api.composition
    await people.service.enterLicence(contextOf(vet, 'veterinarian'), vet.id, {
      id: api.nextId(),
      class: 'veterinary',
      jurisdiction: 'norrell sound',
      number: 'VL-2',
      validFrom: '2026-01-01',
      validUntil: '2026-12-31',
    })
    const attempt = (typed: string) =>
      signing.service.confirmSignatory(contextOf(vet, 'veterinarian'), 'order.sign', typed, parts.clock.now())
    expect((await attempt(password)).licence.number).toBe('VL-2')
    for (let i = 0; i < 5; i++)
      await expect(attempt('wrong')).rejects.toMatchObject({ code: 'password-wrong' })
    await expect(attempt(password)).rejects.toMatchObject({ code: 'sign-in-locked' })
  })

  it('refuses a veterinarian whose licence has ended, and other roles', async () => {
    const vet = await api.person({
      email: 'late@harrow-point.example',
      printedName: 'Late',
      roles: ['veterinarian'],
    })
    const { people, parts, signing } = api.composition
    await people.service.enterLicence(contextOf(vet, 'veterinarian'), vet.id, {
      id: api.nextId(),
      class: 'veterinary',
      jurisdiction: 'Norrell Sound',
      number: 'VL-3',
      validFrom: '2020-01-01',
      validUntil: '2026-11-30',
    })
    const at = parts.clock.now()
    await expect(
      signing.service.confirmSignatory(contextOf(vet, 'veterinarian'), 'order.sign', password, at),
    ).rejects.toMatchObject({ code: 'licence-not-valid' })
    const tech = await api.as('technician')
    await expect(
      signing.service.confirmSignatory(contextOf(tech, 'technician'), 'order.sign', password, at),
    ).rejects.toMatchObject({ code: 'may-not' })
  })

  it('gives out the public key', async () => {
    const keeper = await api.as('keeper')
    const reply = await keeper.agent.get('/api/signing-key').expect(200)
    expect(reply.body.publicKeyPem).toContain('BEGIN PUBLIC KEY')
  })

  it('cannot be changed by the running program', async () => {
    await expect(
      api.composition.parts.dataSource.query(`UPDATE signed_texts SET meaning = 'x'`),
    ).rejects.toMatchObject({ driverError: { code: '42501' } })
  })
})
