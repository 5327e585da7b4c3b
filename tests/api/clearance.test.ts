import pg from 'pg'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import type { CaseDetail } from '../../shared/contracts/quarantine.contract.ts'
import type { CaseStepView } from '../../shared/contracts/quarantine-primitives.ts'
import { aCase } from '../builders/a-case.ts'
import { aClearableCase, clear, expectInside, moveOut } from '../builders/a-clearance.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { aValve } from '../builders/a-water.ts'
import { layoutOf, nfkc, pageCount } from '../pdf/support/poppler.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let owner: pg.Client
let vet: TestPerson
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  vet = await api.as('veterinarian')
})
afterEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

// The fixed day of the tests is 2026-12-01 in Halifax, where days begin at 04:00 UTC.

const licenceOf = { class: 'veterinary' as const, jurisdiction: 'Norrell Sound', validFrom: '2026-01-01' }
const background = {
  actor: { personId: null, printedName: 'Installation', roles: [] },
  requestId: 'test',
}

/** Another veterinarian, licensed until a day. */
async function aVet(name: string, validUntil: string): Promise<TestPerson> {
  const email = `${name.toLowerCase().replaceAll(' ', '.')}@harrow-point.example`
  const person = await api.person({ email, printedName: name, roles: ['veterinarian'] })
  await api.composition.people.service.enterLicence(background, person.id, {
    id: api.nextId(),
    number: `VL-${name.length}`,
    validUntil,
    ...licenceOf,
  })
  return person
}

async function detailOf(one: BuiltCase): Promise<CaseDetail> {
  const { agent } = await api.as('keeper')
  return (await agent.get(one.url).expect(200)).body as CaseDetail
}

async function certificateOf(one: BuiltCase): Promise<Uint8Array> {
  const { agent } = await api.as('keeper')
  const reply = await agent.get(`${one.url}/certificate.pdf`).buffer(true).expect(200)
  expect(reply.headers['content-type']).toBe('application/pdf')
  return reply.body as Uint8Array
}

const textOf = async (one: BuiltCase) => nfkc(layoutOf(await certificateOf(one)))

async function checkOf(one: BuiltCase): Promise<{ state: string; prints: { kind: string }[] }> {
  const { clearance } = await detailOf(one)
  const { agent } = await api.as('registrar')
  return (await agent.get(`/api/checks/${clearance?.signature.hash.slice(0, 16) ?? ''}`).expect(200)).body
}

async function auditOf(one: BuiltCase): Promise<string[]> {
  const { agent } = await api.as('administrator')
  const { body } = await agent.get(`/api/audit?subjectKind=case&subjectId=${one.id}`).expect(200)
  return body.rows.map((row: { action: string }) => row.action)
}

describe('a clearance', () => {
  it('ends quarantine with a signature, lifts the boundary, and stands in the audit trail', async () => {
    const one = await aClearableCase(api)
    expect(await detailOf(one)).toMatchObject({
      readyToClear: true,
      unmet: [],
      earliestClearanceOn: '2026-11-24',
    })
    const signed = await clear(vet, one, { expectedEarliestOn: '2026-11-24' })
    expect(signed.status).toBe(200)
    expect(signed.body).toMatchObject({
      status: 'cleared',
      endedOn: '2026-12-01',
      unmet: [],
      clearance: {
        on: '2026-12-01',
        against: 0,
        reason: null,
        signature: {
          printedName: 'Test veterinarian',
          meaning: 'author of this clearance',
          licence: { number: 'VL-20417', jurisdiction: 'Norrell Sound' },
          signedOn: '2026-12-01',
          state: 'intact',
        },
      },
    })
    expect(signed.body.reasons.at(-1)).toMatchObject({ code: 'cleared' })
    const steps: CaseStepView[] = signed.body.legs.at(-1).steps
    expect(steps.filter(({ state }) => state !== 'done' && state !== 'failed')).toEqual([])
    expect(steps.find(({ kind }) => kind === 'decide')).toMatchObject({ state: 'done', doneOn: '2026-12-01' })
    const { agent } = await api.as('keeper')
    expect((await agent.get(`/api/animals/${one.animal.accession}`)).body.lock).toBe('none')
    const actions = await auditOf(one)
    expect(actions).toContain('case.cleared')
    expect(actions).toContain('signature.make')
  })

  it('is printed as a certificate that says what was signed, and is found again by its record check', async () => {
    const one = await aClearableCase(api)
    await clear(vet, one).expect(200)
    const bytes = await certificateOf(one)
    const text = nfkc(layoutOf(bytes)).replaceAll(/ {2,}/g, '  ')
    for (const words of [
      'Harrow Point Sea Hall',
      'Clearance certificate',
      one.number,
      'Cleared from quarantine on 1 Dec 2026',
      'Simple quarantine, 30 days (QP-30,',
      'version 1), not confirmed by a',
      '25 Oct 2026',
      '37 days ran, 30 wanted',
      one.animal.accession,
      'Every condition of the protocol was met at clearance.',
      'met on 22 Nov 2026, 2 of 2',
      'licence VL-20417, valid to 30 Sep 2027',
      'Norrell Sound',
      'Signed as author of this clearance',
      '14:20:00, UTC−4',
      'The text matches what was signed',
      'It is no permit',
      'Page 1 of 1',
    ])
      expect(text).toContain(words)
    expect(pageCount(bytes)).toBe(1)
    expect(await checkOf(one)).toMatchObject({ state: 'current', prints: [{ kind: 'clearance' }] })
    expect(await auditOf(one)).toContain('case.print-clearance')
  })

  it('against unmet conditions needs a reason, and both stand on the certificate', async () => {
    const one = await aCase(api)
    const unmet = ['length-not-reached', 'negatives-missing']
    const bare = await clear(vet, one, { expectedUnmet: unmet })
    expect([bare.status, bare.body.code, bare.body.errors[0].pointer]).toEqual([
      422,
      'reason-needed',
      '/reason',
    ])
    const reason = 'The wing is closed for repair; they stay isolated in the nursery'
    const signed = await clear(vet, one, { expectedUnmet: [...unmet].reverse(), reason })
    expect(signed.body).toMatchObject({ status: 'cleared', clearance: { against: 2, reason } })
    const text = (await textOf(one)).replaceAll(/\s+/g, ' ')
    expect(text).toContain('30 days plus what was paused: until 10 Dec 2026, 9 days to run.')
    expect(text).toContain('0 of 2')
    expect(text).toContain(`Cleared all the same by Test veterinarian, reason: ${reason}`)
  })

  it('is not signed when something came between the screen and the signature', async () => {
    const one = await aClearableCase(api)
    const { agent } = await api.as('keeper')
    await agent
      .post(`${one.url}/events`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-12-01T18:00:00Z',
        event: { kind: 'addition', what: 'wet-material', into: 'same-water' },
      })
      .expect(201)
    const stale = await clear(vet, one, { reason: 'as it was on the screen' })
    expect([stale.status, stale.body.code]).toEqual([409, 'stale-version'])
    expect(stale.body.unmet).toEqual(['length-not-reached', 'negatives-missing'])
    const moved = await clear(vet, one, {
      expectedUnmet: stale.body.unmet,
      expectedEarliestOn: '2026-11-24',
      reason: 'as it was on the screen',
    })
    expect([moved.status, moved.body.earliestClearanceOn]).toEqual([409, '2026-12-31'])
    expect(await detailOf(one)).toMatchObject({ status: 'in-quarantine', clearance: null })
  })

  it('waits for the hold, and for every other case on that water that is locked', async () => {
    const one = await aClearableCase(api)
    const other = await aClearableCase(api)
    const { agent } = await api.as('keeper')
    const hold = {
      id: api.nextId(),
      happenedAt: '2026-12-01T18:10:00Z',
      origin: 'online',
      device: 'phone',
    }
    await agent.post(`${one.url}/holds`).send(hold).expect(201)
    const held = await clear(vet, one, { expectedUnmet: ['held'], reason: 'They look well to me' })
    expect([held.status, held.body.code, held.body.unmet]).toEqual([409, 'not-clearable', ['held']])
    expect(held.body.detail).toBe('The case is held. A veterinarian has to lift the hold first.')
    const valve = await aValve(
      api,
      'V-CLEAR',
      [one.enclosure.waterBodyId, other.enclosure.waterBodyId],
      false,
    )
    await api.composition.water.services.map.recordConnectionState(
      {
        actor: { personId: vet.id, printedName: vet.printedName, roles: ['veterinarian'] },
        requestId: 'test',
      },
      valve,
      { id: api.nextId(), open: true, happenedAt: '2026-11-30T14:00:00Z', note: null },
    )
    await vet.agent
      .post(`${other.url}/locks`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-12-01T14:00:00Z',
        cause: 'notifiable-suspicion',
        reason: 'Ulcers on three',
      })
      .expect(201)
    await vet.agent
      .post(`${one.url}/lifts`)
      .send({
        id: api.nextId(),
        lockEventId: hold.id,
        happenedAt: '2026-12-01T18:15:00Z',
        reason: 'Looked at',
      })
      .expect(201)
    const shared = await clear(vet, one, { expectedUnmet: ['locked-shared-water'], reason: 'not ours' })
    expect([shared.status, shared.body.code]).toEqual([409, 'not-clearable'])
    expect(shared.body.detail).toContain(other.number)
  })

  it('waits until figures of the batch agree', async () => {
    const one = await aClearableCase(api)
    const { agent } = await api.as('keeper')
    await agent
      .post(`/api/animals/${one.animal.accession}/counts`)
      .send({ id: api.nextId(), basis: 'counted', low: 6, high: 6, happenedAt: '2026-12-01T15:00:00Z' })
      .expect(201)
    expect((await detailOf(one)).openDiscrepancies).toBe(1)
    const refused = await clear(vet, one, { reason: 'two fewer' })
    expect([refused.status, refused.body.code]).toEqual([409, 'discrepancy-open'])
  })

  it('is refused to a veterinarian whose licence has ended, to a wrong password, and to an open batch', async () => {
    const one = await aClearableCase(api)
    const late = await aVet('Late Vet', '2026-11-30')
    expect((await clear(late, one)).body.code).toBe('licence-not-valid')
    expect((await clear(vet, one, { password: 'wrong' })).body.code).toBe('password-wrong')
    expect((await clear(await api.as('technician'), one)).status).toBe(403)
    expect((await clear(vet, one, { reason: 'no' })).status).toBe(422)
    expect((await clear(vet, { url: '/api/cases/Q-9999' })).status).toBe(404)
    const open = await aCase(api, { close: false })
    const early = await clear(vet, open, {
      expectedUnmet: ['negatives-missing', 'not-closed'],
      reason: 'They are all here',
    })
    expect([early.body.code, early.body.unmet]).toEqual(['not-clearable', ['not-closed']])
    expect(await auditOf(one)).not.toContain('case.cleared')
    const { agent } = await api.as('keeper')
    const none = await agent.get(`${one.url}/certificate.pdf`)
    expect([none.status, none.body.detail]).toEqual([404, 'This case has not been cleared.'])
  })

  it('happens once when the request is sent twice, and when two veterinarians sign at one moment', async () => {
    const one = await aClearableCase(api)
    const key = newKey()
    const first = await clear(vet, one, {}, key).expect(200)
    const again = await clear(vet, one, {}, key).expect(200)
    expect(again.body.clearance.signature.hash).toBe(first.body.clearance.signature.hash)
    expect((await clear(vet, one)).body.code).toBe('case-ended')

    const both = await aClearableCase(api)
    const second = await aVet('Second Vet', '2027-06-30')
    const replies = await Promise.all([clear(vet, both), clear(second, both)])
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(replies.find(({ status }) => status === 409)?.body.code).toBe('case-ended')
    expect((await auditOf(both)).filter((action) => action === 'case.cleared')).toHaveLength(1)
    const texts = await owner.query(`SELECT 1 FROM signed_texts WHERE subject_id = $1`, [both.id])
    expect(texts.rowCount).toBe(1)
  })

  it('is void once a sample taken before it comes back positive, on the page, on paper and on looking it up', async () => {
    const one = await aClearableCase(api)
    await clear(vet, one).expect(200)
    await certificateOf(one)
    api.clock.set(new Date(testDay.getTime() + 3 * 3_600_000))
    const { agent } = await api.as('technician')
    await agent
      .post(`${one.url}/results`)
      .send({
        id: api.nextId(),
        takenAt: '2026-12-01T14:00:00Z',
        happenedAt: '2026-12-01T20:00:00Z',
        testKey: 'wet-mount',
        result: 'positive',
        pathogenName: 'a listed virus',
        pathogenStatus: 'listed',
      })
      .expect(201)
    expect(await detailOf(one)).toMatchObject({ status: 'recalled', clearance: { against: 0 } })
    expect(await checkOf(one)).toMatchObject({ state: 'void' })
    const text = await textOf(one)
    expect(text).toContain('Recalled after clearance: void.')
    expect(text).not.toContain('Cleared from quarantine on')
  })
})

describe('a clearance changed in the database', () => {
  // a hand that changes rows can take away what keeps them whole as well
  beforeAll(
    async () => void (await owner.query('ALTER TABLE case_events DROP CONSTRAINT ck_case_events_signed')),
  )
  async function brokenBy(sql: string): Promise<BuiltCase> {
    const one = await aClearableCase(api)
    await clear(vet, one).expect(200)
    await certificateOf(one)
    const { rowCount } = await owner.query(sql, [one.id])
    expect(rowCount).toBe(1)
    return one
  }
  const anotherCase = `(SELECT c.id FROM quarantine_cases c WHERE c.id NOT IN
    (SELECT e.case_id FROM case_events e WHERE e.kind = 'cleared') LIMIT 1)`
  const stateOf = async (one: BuiltCase) => (await detailOf(one)).clearance?.signature.state

  it('is shown as broken when its text was changed', async () => {
    const one = await brokenBy(
      `UPDATE signed_texts SET text = replace(text, '"wanted":2', '"wanted":1') WHERE subject_id = $1`,
    )
    expect(await stateOf(one)).toBe('broken')
    await expectInside(api, one)
    const moved = await moveOut(api, one)
    expect([moved.status, moved.body.code]).toEqual([403, 'documented-transfer-needed'])
    expect(await textOf(one)).toContain('Record check failed')
    expect(await checkOf(one)).toMatchObject({ state: 'broken' })
  })

  it.each([
    ['the day', `UPDATE case_events SET happened_at = happened_at - interval '9 days' WHERE case_id = $1`],
    ['the reason', `UPDATE case_events SET reason = 'as agreed' WHERE case_id = $1`],
    ['that it was signed', `UPDATE case_events SET signed_text_id = NULL WHERE case_id = $1`],
    [
      'the text that it points at',
      `UPDATE case_events SET signed_text_id =
         (SELECT id FROM signed_texts WHERE subject_id <> $1::uuid ORDER BY id LIMIT 1) WHERE case_id = $1`,
    ],
  ])('is shown as broken when its row was changed: %s', async (_what, sql) => {
    const one = await brokenBy(`${sql} AND kind = 'cleared'`)
    expect(await stateOf(one)).toBe('broken')
    await expectInside(api, one)
    const reply = await (await api.as('keeper')).agent.get(`${one.url}/certificate.pdf`).buffer(true)
    if (reply.status === 200) expect(await textOf(one)).toContain('Record check failed')
    else expect(reply.body.code).toBe('broken-record')
  })

  it.each([
    ['is gone', 'DELETE FROM case_events WHERE case_id = $1'],
    ['says something else', `UPDATE case_events SET kind = 'closed' WHERE case_id = $1`],
    ['went to another case', `UPDATE case_events SET case_id = ${anotherCase} WHERE case_id = $1`],
  ])('lets no animal out where its row %s', async (_what, sql) => {
    await expectInside(api, await brokenBy(`${sql} AND kind = 'cleared'`))
  })

  it('is not printed at all when nothing can be read of it any more', async () => {
    const one = await brokenBy(`UPDATE signed_texts SET text = 'nothing' WHERE subject_id = $1`)
    expect(await stateOf(one)).toBe('broken')
    const { agent } = await api.as('keeper')
    const reply = await agent.get(`${one.url}/certificate.pdf`)
    expect([reply.status, reply.body.code]).toEqual([409, 'broken-record'])
  })

  it('says so of a signed cause of death whose row was changed', async () => {
    const one = await aCase(api)
    const keeper = await api.as('keeper')
    const death = { id: api.nextId(), kind: 'found-dead', count: 1, happenedAt: '2026-11-20T14:00:00Z' }
    await keeper.agent.post(`/api/animals/${one.animal.accession}/deaths`).send(death).expect(201)
    await vet.agent
      .post(`${one.url}/deaths/${death.id}/cause`)
      .set('Idempotency-Key', newKey())
      .send({ finding: 'explained-transmissible', cause: 'velvet disease', password: 'chart-paper-7' })
      .expect(200)
    await owner.query(
      `UPDATE case_events SET facts = facts || '{"finding":"explained-not-transmissible"}'
        WHERE case_id = $1 AND kind = 'death-cause-signed'`,
      [one.id],
    )
    expect((await detailOf(one)).deaths).toMatchObject([{ signature: { state: 'broken' } }])
    await owner.query(
      `UPDATE case_events SET signed_text_id = NULL WHERE case_id = $1 AND kind = 'death-cause-signed'`,
      [one.id],
    )
    expect((await detailOf(one)).deaths).toMatchObject([{ signature: { state: 'broken' } }])
  })
})
