import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import request from 'supertest'
import { allContracts } from '../../shared/contracts/index.ts'
import type { Contract } from '../../shared/contracts/contract.ts'
import { decide } from '../../shared/domain/permissions/decide.ts'
import { roles } from '../../shared/domain/permissions/roles.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => {
  api = await startApi()
  for (const role of roles) await api.as(role)
})
afterAll(() => api.stop())

const someId = '019a0000-0000-7000-8000-000000000000'
// Parameters that no record has: a permitted call gets past the guard and fails later, never with 401 or 403 by role.
const addressOf = (of: Contract) => `/api${of.path.replace(/:\w+/g, someId)}`
// These end or change the session that the walk itself uses.
const ownSession = new Set(['signIn', 'signOut'])

describe('every address and every role', () => {
  for (const of of allContracts.filter((one) => one.action !== 'public')) {
    it(`${of.method.toUpperCase()} ${of.path} is closed to people who are not signed in`, async () => {
      const reply = await request(api.app)[of.method](addressOf(of)).send()
      expect(reply.status).toBe(401)
      expect(reply.body.code).toBe('not-signed-in')
    })
  }

  for (const of of allContracts.filter((one) => one.action !== 'public' && !ownSession.has(one.id)))
    for (const role of roles) {
      const allowed = of.action === 'signed-in' || decide(of.action as never, [role as Role]).allowed
      it(`${of.id}: ${role} ${allowed ? 'may' : 'may not'}`, async () => {
        const { agent } = await api.as(role)
        const reply = await agent[of.method](addressOf(of)).set('Idempotency-Key', newKey()).send({})
        if (allowed) {
          expect(reply.body.code).not.toBe('may-not')
          expect(reply.status).not.toBe(401)
          expect(reply.status).toBeLessThan(500)
        } else {
          expect(reply.status).toBe(403)
          expect(reply.body.code).toBe('may-not')
          expect(reply.body.detail).toMatch(/^This is for /)
        }
      })
    }

  it('notes every refusal in the audit trail', async () => {
    const admin = await api.as('administrator')
    const trail = await admin.agent.get('/api/audit?q=permission.refuse&limit=1').expect(200)
    expect(trail.body.total).toBeGreaterThan(0)
    expect(trail.body.rows[0]).toMatchObject({ action: 'permission.refuse', subjectKind: 'route' })
  })
})
