import { createHash } from 'node:crypto'
import { rm, writeFile } from 'node:fs/promises'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Response } from 'superagent'
import { verifyFiles } from '../../server/platform/files/verify-files.ts'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import { anAcquisition, aPermit, newLine, pdfBytes } from '../builders/a-register.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let transaction: string
beforeAll(async () => {
  api = await startApi()
  const taxonId = await aStingray(api)
  const tank = await aPlace(api)
  transaction = `/api/register/transactions/${
    (await anAcquisition(api, { lines: [newLine(api, { taxonId, enclosureId: tank.id })] })).number
  }`
})
afterAll(() => api.stop())

interface UploadGiven {
  id?: string
  title?: string
  kind?: string
  bytes?: Buffer
  name?: string
  to?: string
  role?: 'registrar' | 'veterinarian'
}
async function upload(given: UploadGiven = {}): Promise<Response> {
  const { agent } = await api.as(given.role ?? 'registrar')
  return agent
    .post(`${given.to ?? transaction}/documents`)
    .field('id', given.id ?? api.nextId())
    .field('title', given.title ?? 'Loan agreement LA-26-04')
    .field('kind', given.kind ?? 'loan-agreement')
    .attach('file', given.bytes ?? pdfBytes(), { filename: given.name ?? 'agreement.pdf' })
}

describe('a paper', () => {
  it('is not given out once its file was altered or lost, and both are found and put on record', async () => {
    const bytes = pdfBytes('a paper that somebody alters')
    const { body } = await upload({ bytes, title: 'Altered on the disk' })
    const { dataFolder, files } = api.composition.parts
    const { sha256 } = body as { sha256: string }
    const place = path.join(dataFolder, 'files', sha256.slice(0, 2), sha256)
    const faults = async () =>
      (await verifyFiles(files, await api.composition.documents.filesOnRecord())).faults
    expect(await faults()).toEqual([])
    const { agent } = await api.as('keeper')
    const fetched = () => agent.get(`/api/documents/${String(body.id)}/file`)

    await writeFile(place, Buffer.concat([bytes, Buffer.from('%')]))
    const altered = await fetched()
    expect(altered.status).toBe(500)
    expect(altered.body.code).toBe('file-damaged')
    expect(altered.body.detail).toMatch(/backup/)
    expect(await faults()).toMatchObject([{ at: 'Altered on the disk', what: 'damaged' }])

    await rm(place)
    const lost = await fetched()
    expect(lost.status).toBe(410)
    expect(lost.body.code).toBe('file-gone')
    expect(await faults()).toMatchObject([{ at: 'Altered on the disk', what: 'missing' }])

    const actions: { action: string }[] = await api.composition.parts.dataSource.query(
      `SELECT a.action FROM audit_entries a WHERE a.action LIKE 'file.find-%' ORDER BY a.seq`,
    )
    expect(actions.map(({ action }) => action)).toEqual(['file.find-damaged', 'file.find-gone'])
    // brought again, it is there again
    await upload({ bytes })
    await fetched().expect(200)
    expect(await faults()).toEqual([])
  })

  it('has no title that nothing could show again', async () => {
    const reply = await upload({ title: 'Loan\u0000agreement' })
    expect(reply.status).toBe(422)
    expect(reply.body.errors).toEqual([
      {
        pointer: '/title',
        code: 'character-not-writable',
        detail: expect.stringMatching(/cannot be written/),
      },
    ])
  })

  it('is kept under its hash and comes back exactly as it was sent', async () => {
    const bytes = pdfBytes('a paper of its own')
    const reply = await upload({ bytes, name: 'Vertrag für Brine.pdf' })
    expect(reply.status).toBe(201)
    expect(reply.body).toMatchObject({
      title: 'Loan agreement LA-26-04',
      kind: 'loan-agreement',
      fileName: 'Vertrag für Brine.pdf',
      mediaType: 'application/pdf',
      bytes: bytes.length,
      sha256: createHash('sha256').update(bytes).digest('hex'),
      attachedBy: 'Test registrar',
      voided: null,
    })
    const keeper = await api.as('keeper')
    const file = await keeper.agent.get(`/api/documents/${String(reply.body.id)}/file`).expect(200)
    expect(Buffer.compare(file.body as Buffer, bytes)).toBe(0)
    expect(file.headers['content-type']).toBe('application/pdf')
    expect(file.headers['content-disposition']).toContain('attachment')
    const shown = await keeper.agent.get(transaction)
    expect(shown.body.documents.map((paper: { id: string }) => paper.id)).toContain(reply.body.id)
    const admin = await api.as('administrator')
    const trail = await admin.agent.get('/api/audit?q=document.attach&limit=1')
    expect(trail.body.rows[0].after).toMatchObject({
      sha256: reply.body.sha256,
      fileName: 'Vertrag für Brine.pdf',
    })
  })

  it('is attached once when it is sent twice', async () => {
    const id = api.nextId()
    const replies = [await upload({ id }), await upload({ id })]
    expect(replies.map((reply) => reply.status)).toEqual([201, 201])
    const other = await upload({ id, bytes: pdfBytes('other words') })
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
    const { agent } = await api.as('registrar')
    const shown = await agent.get(transaction)
    expect(shown.body.documents.filter((paper: { id: string }) => paper.id === id)).toHaveLength(1)
  })

  it('belongs to a permit as well', async () => {
    const permit = await aPermit(api)
    const to = `/api/register/permits/${permit.number}`
    const reply = await upload({ to, kind: 'permit' })
    const { agent } = await api.as('registrar')
    expect((await agent.get(to)).body).toMatchObject({ documents: 1, papers: [{ id: reply.body.id }] })
  })

  it('is refused when it is of a type that is not kept, whatever its name says', async () => {
    const program = Buffer.from('7f454c4602010100', 'hex')
    const page = Buffer.from('<html><script>1</script></html>')
    for (const bytes of [program, page]) {
      const reply = await upload({ bytes, name: 'permit.pdf' })
      expect([reply.status, reply.body.code, reply.body.errors[0].pointer]).toEqual([
        422,
        'file-type-not-allowed',
        '/file',
      ])
    }
  })

  it('is refused when it is too large, empty or absent', async () => {
    const large = await upload({ bytes: Buffer.concat([pdfBytes(), Buffer.alloc(15 * 1024 * 1024)]) })
    expect([large.status, large.body.code]).toEqual([422, 'file-too-large'])
    const empty = await upload({ bytes: Buffer.alloc(0) })
    expect([empty.status, empty.body.code]).toEqual([422, 'file-missing'])
    const { agent } = await api.as('registrar')
    const none = await agent.post(`${transaction}/documents`).field('id', api.nextId()).field('title', 'x')
    expect([none.status, none.body.code]).toEqual([422, 'file-missing'])
  })

  it('is refused with everything that is wrong with its fields', async () => {
    const reply = await upload({ id: 'not-an-id', title: ' ', kind: 'poster' })
    expect(reply.body.errors.map((e: { pointer: string }) => e.pointer).sort()).toEqual([
      '/id',
      '/kind',
      '/title',
    ])
  })

  it('is attached by whoever may write the record it belongs to, and to a record that is there', async () => {
    const vet = await upload({ role: 'veterinarian' })
    expect([vet.status, vet.body.code]).toEqual([403, 'may-not'])
    expect((await upload({ to: '/api/register/transactions/TR-9999' })).status).toBe(404)
  })

  it('that was attached wrongly is voided and stays readable', async () => {
    const { id } = (await upload({ title: 'Wrong paper' })).body as { id: string }
    const { agent } = await api.as('registrar')
    const voidIt = () =>
      agent
        .post(`/api/documents/${id}/void`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'Of another shipment' })
    expect((await voidIt()).body.voided).toMatchObject({
      reason: 'Of another shipment',
      by: 'Test registrar',
    })
    expect((await voidIt()).body.code).toBe('already-voided')
    await agent.get(`/api/documents/${id}/file`).expect(200)
    const vet = await api.as('veterinarian')
    const refused = await vet.agent
      .post(`/api/documents/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Not mine to void' })
    expect([refused.status, refused.body.code]).toEqual([403, 'may-not'])
  })

  it('is closed to whoever may not read the register', async () => {
    const { id } = (await upload()).body as { id: string }
    const admin = await api.as('administrator')
    const reply = await admin.agent.get(`/api/documents/${id}/file`)
    expect([reply.status, reply.body.code]).toEqual([403, 'may-not'])
    expect((await admin.agent.get(`/api/documents/${api.nextId()}/file`)).status).toBe(404)
  })
})
