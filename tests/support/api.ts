import type { Express } from 'express'
import { randomUUID } from 'node:crypto'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import request from 'supertest'
import { createApp } from '../../server/app.ts'
import { compose } from '../../server/composition.ts'
import type { Composition } from '../../server/composition.ts'
import { seedDemo } from '../../server/demo/seed-demo.ts'
import { entities } from '../../server/entities.ts'
import { settableClock } from '../../server/platform/clock.ts'
import { connectRuntime, poolOf } from '../../server/platform/database/data-source.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import { startJobs } from '../../server/platform/jobs/jobs.ts'
import { createLog } from '../../server/platform/log.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import type { SettingKey } from '../../shared/domain/settings/settings.ts'
import { cloneDatabase } from './database.ts'
import { testDay } from './test-time.ts'

export const password = 'chart-paper-7'
export { testDay }

export interface TestPerson {
  id: string
  email: string
  printedName: string
  agent: ReturnType<typeof request.agent>
}

export interface TestApi {
  app: Express
  composition: Composition
  ownerUrl: string
  runtimeUrl: string
  clock: ReturnType<typeof settableClock>
  /** A request of nobody. */
  anonymous(): ReturnType<typeof request>
  /** The one person who holds just this role, signed in. The veterinarian has a valid licence. */
  as(role: Role): Promise<TestPerson>
  /** Another person, signed in. */
  person(given: { email: string; printedName: string; roles: Role[] }): Promise<TestPerson>
  setSetting(key: SettingKey, value: string): Promise<void>
  nextId(): string
  stop(): Promise<void>
}

export const newKey = () => randomUUID()
const background = { actor: installation, requestId: 'test' }

export interface ApiOptions {
  smtpUrl?: string
  jobs?: boolean
  /** By default it stands still on the test day. */
  clock?: TestApi['clock']
  /** The practice scenario with its people, in place of an empty house with one person a role. */
  demo?: boolean
}

/** The whole server on a database of its own, as the runtime role, on a fixed day, with one person a role. */
export async function startApi(given: ApiOptions = {}): Promise<TestApi> {
  const database = await cloneDatabase()
  const dataSource = await connectRuntime(database.runtimeUrl, entities, 6)
  const clock = given.clock ?? settableClock(testDay)
  const dataFolder = await mkdtemp(path.join(tmpdir(), 'pratique-test-'))
  const outside = { dataSource, clock, log: createLog('silent'), dataFolder }
  if (given.demo) await seedDemo(outside)
  const composition = compose({
    ...outside,
    demo: given.demo ?? false,
    smtpUrl: given.smtpUrl ?? null,
    publicUrl: 'https://pratique.example',
  })
  const jobs = given.jobs ? await startJobs(poolOf(dataSource), composition.jobs, createLog('silent')) : null
  const { app, close } = createApp({
    config: { sessionSecret: 'x'.repeat(40), publicUrl: null, mode: 'test' },
    composition,
  })
  const { people, facility, parts } = composition
  const nextId = () => parts.ids.next()

  async function setSetting(key: SettingKey, value: string): Promise<void> {
    const id = nextId()
    await facility.service.proposeSetting(background, key, { id, value })
    await facility.service.confirmSetting(background, key, id)
  }
  if (!given.demo) {
    await setSetting('facility.name', 'Harrow Point Sea Hall')
    await setSetting('facility.zone', 'America/Halifax')
    await setSetting('facility.jurisdictions', 'Norrell Sound')
  }

  async function person(given: { email: string; printedName: string; roles: Role[] }): Promise<TestPerson> {
    const id = nextId()
    await people.service.enterPerson(background, { id, ...given, password })
    const agent = request.agent(app)
    const reply = await agent.post('/api/sign-in').send({ email: given.email, password })
    if (reply.status !== 200) throw new Error(`sign-in of ${given.email} answered ${String(reply.status)}`)
    return { id, email: given.email, printedName: given.printedName, agent }
  }

  const byRole = new Map<Role, Promise<TestPerson>>()
  async function enterRole(role: Role): Promise<TestPerson> {
    const made = await person({
      email: `${role}@harrow-point.example`,
      printedName: `Test ${role}`,
      roles: [role],
    })
    if (role === 'veterinarian')
      await people.service.enterLicence(background, made.id, {
        id: nextId(),
        class: 'veterinary',
        jurisdiction: 'Norrell Sound',
        number: 'VL-20417',
        validFrom: '2024-01-01',
        validUntil: '2027-09-30',
      })
    return made
  }

  return {
    app,
    composition,
    ownerUrl: database.ownerUrl,
    runtimeUrl: database.runtimeUrl,
    clock,
    anonymous: () => request(app),
    as(role) {
      const known = byRole.get(role) ?? enterRole(role)
      byRole.set(role, known)
      return known
    },
    person,
    setSetting,
    nextId,
    async stop() {
      close()
      await jobs?.stop()
      await composition.close()
      await dataSource.destroy()
      await rm(dataFolder, { recursive: true, force: true })
    },
  }
}
