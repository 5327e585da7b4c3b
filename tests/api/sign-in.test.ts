import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import pg from 'pg'
import request from 'supertest'
import { createLockout } from '../../server/platform/sign-in/lockout.ts'
import { password, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => void (api = await startApi()))
afterAll(() => api.stop())

describe('sign-in', () => {
  it('signs a person in and says who they are, without the password hash', async () => {
    const vet = await api.as('veterinarian')
    const me = await vet.agent.get('/api/me').expect(200)
    expect(me.body).toMatchObject({
      printedName: 'Test veterinarian',
      roles: ['veterinarian'],
      mayPractise: true,
    })
    expect(me.body.facility).toMatchObject({ name: 'Harrow Point Sea Hall', zone: 'America/Halifax' })
    expect(JSON.stringify(me.body)).not.toContain('argon2')
  })

  it('sets a cookie that scripts and other sites cannot use', async () => {
    await api.as('keeper')
    const reply = await api
      .anonymous()
      .post('/api/sign-in')
      .send({ email: 'keeper@harrow-point.example', password })
    const [cookie] = reply.headers['set-cookie'] as unknown as string[]
    expect(cookie).toMatch(/^pratique\.sid=.+HttpOnly; SameSite=Lax/)
  })

  it('says the same for a wrong password and for an account that does not exist', async () => {
    await api.as('registrar')
    const wrong = await api
      .anonymous()
      .post('/api/sign-in')
      .send({ email: 'registrar@harrow-point.example', password: 'not this one' })
    const nobody = await api
      .anonymous()
      .post('/api/sign-in')
      .send({ email: 'nobody@harrow-point.example', password: 'not this one' })
    expect(wrong.status).toBe(401)
    const { request_id: _a, ...wrongBody } = wrong.body
    const { request_id: _b, ...nobodyBody } = nobody.body
    expect(wrongBody).toEqual(nobodyBody)
    expect(wrong.type).toBe('application/problem+json')
  })

  it.each(['tired@harrow-point.example', 'not-here@harrow-point.example'])(
    'locks %s for 15 minutes after 5 wrong tries, whether it exists or not',
    async (email) => {
      if (email.startsWith('tired'))
        await api.person({ email, printedName: 'Tired Keeper', roles: ['keeper'] })
      for (let i = 0; i < 5; i++)
        await api.anonymous().post('/api/sign-in').send({ email, password: 'wrong' }).expect(401)
      const locked = await api.anonymous().post('/api/sign-in').send({ email, password }).expect(429)
      expect(locked.body.code).toBe('sign-in-locked')
      expect(locked.body.detail).toContain('15 min')
      expect(locked.headers['retry-after']).toBe('900')
      const before = api.clock.now()
      api.clock.set(new Date(before.getTime() + 15 * 60_000 + 1000))
      await api
        .anonymous()
        .post('/api/sign-in')
        .send({ email, password })
        .expect(email.startsWith('tired') ? 200 : 401)
      api.clock.set(before)
    },
  )

  it('tries no more than 5 of 30 wrong passwords that come at once', async () => {
    const email = 'at-once@harrow-point.example'
    const person = await api.person({ email, printedName: 'Tried At Once', roles: ['keeper'] })
    const statuses = async (send: (typed: string) => PromiseLike<{ status: number }>) => {
      const replies = await Promise.all(Array.from({ length: 30 }, (_, i) => send(`wrong ${String(i)}`)))
      return replies.map(({ status }) => status).sort()
    }
    const fiveOfThirty = (wrong: number) => [...Array<number>(5).fill(wrong), ...Array<number>(25).fill(429)]
    const signIn = (typed: string) => api.anonymous().post('/api/sign-in').send({ email, password: typed })
    expect(await statuses(signIn)).toEqual(fiveOfThirty(401))
    // the form of somebody who is signed in has a lock of its own
    const change = (currentPassword: string) =>
      person.agent.post('/api/me/password').send({ currentPassword, newPassword: 'another one, longer' })
    expect(await statuses(change)).toEqual(fiveOfThirty(403))
  })

  it('tries no more than 5 also where several processes of the server are asked at once', async () => {
    const { dataSource, clock } = api.composition.parts
    const tried = { emailKey: 'own:several', address: '' }
    let looked = 0
    const outcomes = await Promise.allSettled(
      Array.from({ length: 30 }, () =>
        createLockout({ dataSource, clock }).attempt(
          tried,
          () => Promise.resolve((looked += 1)).then(() => null),
          String,
        ),
      ),
    )
    expect(looked).toBe(5)
    expect(outcomes.filter(({ status }) => status === 'fulfilled')).toHaveLength(5)
  })

  it('locks only where the wrong tries came from, and not a house of many people', async () => {
    const email = 'elsewhere@harrow-point.example'
    await api.person({ email, printedName: 'Guessed At', roles: ['keeper'] })
    const { lockout } = api.composition
    const tryWrongly = (address: string) =>
      lockout.attempt({ emailKey: email, address }, () => Promise.resolve(null), String)
    for (let i = 0; i < 5; i++) await tryWrongly('203.0.113.9')
    expect(await lockout.minutesLocked({ emailKey: email, address: '203.0.113.9' })).toBe(15)
    await api.anonymous().post('/api/sign-in').send({ email, password }).expect(200)
    // guessing from many addresses at once is still stopped
    for (let i = 0; i < 50; i++) await tryWrongly(`198.51.100.${String(i)}`)
    await api.anonymous().post('/api/sign-in').send({ email, password }).expect(429)
    // a shift begins: more people than were once let in from one address
    const keeper = { email: 'keeper@harrow-point.example', password }
    for (let batch = 0; batch < 8; batch++) {
      const replies = await Promise.all(
        Array.from({ length: 8 }, () => api.anonymous().post('/api/sign-in').send(keeper)),
      )
      expect(new Set(replies.map(({ status }) => status))).toEqual(new Set([200]))
    }
  })

  it('slows an address at which sign-ins fail again and again down to 2 guesses an account, and lets in who belongs', async () => {
    const before = api.clock.now()
    api.clock.set(new Date(before.getTime() + 3_600_000))
    const emailOf = (name: string) => `${name}@harrow-point.example`
    for (const name of ['mistyped', 'guessed', 'at-hand'])
      await api.person({ email: emailOf(name), printedName: `Was ${name}`, roles: ['keeper'] })
    const signIn = (name: string, typed: string) =>
      api
        .anonymous()
        .post('/api/sign-in')
        .send({ email: emailOf(name), password: typed })
    // a shift that signs in rightly counts for nothing, and the address of the house is the one that the test asks from
    const { lockout, parts } = api.composition
    await signIn('mistyped', 'wrong').expect(401)
    const [{ address }] = await parts.dataSource.query<[{ address: string }]>(
      `SELECT address FROM sign_in_tries WHERE email_key = $1`,
      [emailOf('mistyped')],
    )
    const elsewhere = { emailKey: 'somebody', address: '192.0.2.77' }
    for (let i = 0; i < 300; i++) await lockout.attempt(elsewhere, () => Promise.resolve('right'), String)
    expect(await lockout.attempt(elsewhere, () => Promise.resolve(null), String)).toBeNull()
    // somebody guesses over many accounts from this house
    for (let i = 1; i < 300; i++)
      await lockout.attempt({ emailKey: `guess ${String(i)}`, address }, () => Promise.resolve(null), String)
    const slowed = await signIn('guessed', 'wrong').expect(429)
    expect([slowed.body.code, slowed.headers['retry-after']]).toEqual(['too-many-requests', '900'])
    expect(slowed.body.detail).toBe(
      'E-mail and password do not fit. Many sign-ins failed at this address, for instance in the network of one house. The right password still opens each account; 2 wrong ones lock it here for 15 minutes.',
    )
    // an account that does not exist answers alike
    const { request_id: _a, ...nobody } = (await signIn('not-there', 'wrong').expect(429)).body
    const { request_id: _b, ...somebody } = slowed.body
    expect(nobody).toEqual(somebody)
    expect((await signIn('guessed', 'wrong again').expect(429)).body.code).toBe('too-many-requests')
    expect((await signIn('guessed', password).expect(429)).body.code).toBe('sign-in-locked')
    // a colleague at the tank gets in, also after one slip, and also whoever mistyped before
    await signIn('at-hand', 'slip').expect(429)
    await signIn('at-hand', password).expect(200)
    await signIn('mistyped', password).expect(200)
    api.clock.set(new Date(api.clock.now().getTime() + 15 * 60_000 + 1000))
    await signIn('guessed', 'wrong').expect(401)
    api.clock.set(before)
  })

  it('ends the other sessions of whoever changes their password', async () => {
    const here = await api.person({
      email: 'twice@harrow-point.example',
      printedName: 'Two Devices',
      roles: ['keeper'],
    })
    const there = request.agent(api.app)
    await there.post('/api/sign-in').send({ email: here.email, password }).expect(200)
    await here.agent
      .post('/api/me/password')
      .send({ currentPassword: password, newPassword: 'long enough now' })
      .expect(200)
    await here.agent.get('/api/me').expect(200)
    await there.get('/api/me').expect(401)
  })

  it('takes a withdrawn role away at once, in a session that is open', async () => {
    const admin = await api.as('administrator')
    const person = await api.person({
      email: 'was-registrar@harrow-point.example',
      printedName: 'Was Registrar',
      roles: ['registrar', 'keeper'],
    })
    const { body: row } = await admin.agent.get(`/api/people/${person.id}`).expect(200)
    const exportsOf = () => person.agent.post('/api/taxa').send({})
    expect((await exportsOf()).status).toBe(422)
    await admin.agent
      .put(`/api/people/${person.id}`)
      .send({
        email: person.email,
        printedName: person.printedName,
        roles: ['keeper'],
        active: true,
        expectedVersion: row.version,
      })
      .expect(200)
    expect((await exportsOf()).status).toBe(403)
  })

  it('answers 401 to signed-out calls before any parameter is read', async () => {
    const reply = await api.anonymous().get('/api/people/not-an-id').expect(401)
    expect(reply.body.code).toBe('not-signed-in')
    await api
      .anonymous()
      .post('/api/people')
      .set('Content-Type', 'application/json')
      .send('{broken')
      .expect(401)
  })

  it('ends the session on sign-out', async () => {
    const someone = await api.person({
      email: 'out@harrow-point.example',
      printedName: 'Out',
      roles: ['keeper'],
    })
    await someone.agent.post('/api/sign-out').expect(204)
    await someone.agent.get('/api/me').expect(401)
  })

  it('lets a session live on while it is used, and writes that once a minute', async () => {
    const owner = new pg.Client({ connectionString: api.ownerUrl })
    await owner.connect()
    try {
      const email = 'stays@harrow-point.example'
      const someone = await api.person({ email, printedName: 'Stays', roles: ['keeper'] })
      const endsSoon = async () => {
        const ended = await owner.query(
          `UPDATE session SET expire = now() + interval '5 minutes' WHERE sess #>> '{passport,user}' = $1`,
          [someone.id],
        )
        expect(ended.rowCount).toBe(1)
      }
      const hoursLeft = async () => {
        await someone.agent.get('/api/me').expect(200)
        const { rows } = await owner.query<{ hours: string }>(
          `SELECT extract(epoch FROM expire - now()) / 3600 AS hours FROM session WHERE sess #>> '{passport,user}' = $1`,
          [someone.id],
        )
        return Number(rows[0]?.hours)
      }
      await endsSoon()
      expect(await hoursLeft()).toBeGreaterThan(7)
      await endsSoon()
      expect(await hoursLeft()).toBeLessThan(1)
    } finally {
      await owner.end()
    }
  })

  it('refuses a state-changing request from another site', async () => {
    const keeper = await api.as('keeper')
    const put = () => keeper.agent.put('/api/me/preferences/theme').send({ value: 'night' })
    expect((await put().set('Origin', 'https://elsewhere.example')).body.code).toBe('foreign-origin')
    expect((await put().set('Sec-Fetch-Site', 'cross-site')).body.code).toBe('foreign-origin')
    expect((await put().set('Origin', 'null')).body.code).toBe('foreign-origin')
    await put().expect(200)
  })

  it('takes nothing that another person wrote than the one who is signed in', async () => {
    const keeper = await api.as('keeper')
    const admin = await api.as('administrator')
    const note = (writtenBy: string) => {
      const id = api.nextId()
      const send = keeper.agent
        .post('/api/handover-notes')
        .set('Pratique-Person', writtenBy)
        .send({ id, words: `Written by ${writtenBy}` })
      return { id, send }
    }
    const own = await note(keeper.id).send
    expect(own.status).toBe(201)
    const foreign = await note(admin.id).send
    expect(foreign.status).toBe(409)
    expect(foreign.body).toMatchObject({ code: 'different-person', signed_in: 'Test keeper' })
    expect(foreign.body.detail).toMatch(/Nothing of it was saved/)
    const notes = (await keeper.agent.get('/api/today').expect(200)).text
    expect(notes).toContain(`Written by ${keeper.id}`)
    expect(notes).not.toContain(`Written by ${admin.id}`)
    // also what the one who is signed in may not do is no refusal of theirs: it was another who wrote it
    const people = await keeper.agent
      .post('/api/people')
      .set('Pratique-Person', admin.id)
      .send({ id: api.nextId() })
    expect(people.body.code).toBe('different-person')
    // and whoever has signed out is asked to sign in first
    await api.anonymous().post('/api/handover-notes').set('Pratique-Person', admin.id).send({}).expect(401)
    // reading writes nothing, and signing in is how the person changes
    await keeper.agent.get('/api/me').set('Pratique-Person', admin.id).expect(200)
  })

  it('asks for a new password after a one-time password, and for nothing before it', async () => {
    const admin = await api.as('administrator')
    const id = api.nextId()
    const entered = await admin.agent
      .post('/api/people')
      .send({ id, email: 'new@harrow-point.example', printedName: 'New Hand', roles: ['keeper'] })
      .expect(201)
    const oneTime = entered.body.oneTimePassword as string
    expect(oneTime).toMatch(/^[a-z2-9]{4}-[a-z2-9]{4}-[a-z2-9]{4}$/)
    const agent = request.agent(api.app)
    const me = await agent
      .post('/api/sign-in')
      .send({ email: 'new@harrow-point.example', password: oneTime })
      .expect(200)
    expect(me.body.mustChangePassword).toBe(true)
    expect((await agent.get('/api/settings').expect(403)).body.code).toBe('password-change-required')
    const change = (currentPassword: string, newPassword: string) =>
      agent.post('/api/me/password').send({ currentPassword, newPassword })
    expect((await change('wrong', 'long enough now').expect(403)).body.code).toBe('password-wrong')
    expect((await change(oneTime, 'short').expect(422)).body.errors[0].pointer).toBe('/newPassword')
    expect((await change(oneTime, oneTime).expect(422)).body.code).toBe('password-too-weak')
    await change(oneTime, 'long enough now').expect(200)
    await agent.get('/api/settings').expect(200)
  })

  it('counts wrong passwords of somebody signed in towards one lock, in whatever form', async () => {
    const { id, agent } = await api.as('veterinarian')
    const { signing, parts } = api.composition
    const actor = { personId: id, printedName: 'Vet', roles: ['veterinarian' as const] }
    const change = (currentPassword: string) =>
      agent.post('/api/me/password').send({ currentPassword, newPassword: 'another one, longer' })
    const sign = (typed: string) =>
      signing.service.confirmSignatory({ actor, requestId: 'test' }, 'order.sign', typed, parts.clock.now())
    for (let i = 0; i < 3; i++) await change('wrong').expect(403)
    for (let i = 0; i < 2; i++) await expect(sign('wrong')).rejects.toMatchObject({ code: 'password-wrong' })
    const locked = await change(password).expect(429)
    expect([locked.body.code, locked.headers['retry-after']]).toEqual(['sign-in-locked', '900'])
    expect(locked.body.detail).toContain('15 min')
    await expect(sign(password)).rejects.toMatchObject({ code: 'sign-in-locked' })
    const before = api.clock.now()
    api.clock.set(new Date(before.getTime() + 15 * 60_000 + 1000))
    await change(password).expect(200)
    api.clock.set(before)
  })

  it.each(['a\u0000b', 'half \ud800', 'bell \u0007'])(
    'refuses text that nothing could show again: %j',
    async (odd) => {
      const keeper = await api.as('keeper')
      const body = JSON.stringify({ id: api.nextId(), words: odd })
      const note = await keeper.agent
        .post('/api/handover-notes')
        .set('Content-Type', 'application/json')
        .send(body)
      expect(note.status).toBe(422)
      expect(note.body.errors).toEqual([
        {
          pointer: '/words',
          code: 'character-not-writable',
          detail: expect.stringMatching(/cannot be written/),
        },
      ])
      const found = await keeper.agent.get('/api/animals?q=%00')
      expect(found.status).toBe(422)
    },
  )
})
