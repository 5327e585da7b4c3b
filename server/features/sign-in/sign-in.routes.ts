import type { Request } from 'express'
import type {} from 'express-session'
import passport from 'passport'
import { Strategy } from 'passport-local'
import * as contracts from '../../../shared/contracts/sign-in.contract.ts'
import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import type { SignedIn } from '../../platform/http/guard.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { Lockout } from '../../platform/sign-in/lockout.ts'
import { decoyHash, isPassword } from '../../platform/sign-in/passwords.ts'
import type { People } from '../people/index.ts'
import type { MeReader } from './read-me.ts'

/** The person of a request, as passport loaded them. */
export function personOf(req: Request): SignedIn | null {
  return (req.user as SignedIn | undefined) ?? null
}

const makePassport = () => new passport.Passport()
export type Authenticator = ReturnType<typeof makePassport>

/** Passport with the one strategy there is: e-mail and password. Sessions hold the person's id only. */
export function createAuthenticator(people: People): Authenticator {
  const authenticator = makePassport()
  authenticator.use(
    new Strategy({ usernameField: 'email', session: true }, (email, password, done) => {
      const check = async (): Promise<SignedIn | false> => {
        const found = await people.readCredentials(email)
        const matches = await isPassword(found?.password_hash ?? (await decoyHash()), password)
        if (!found || !matches || !found.active) return false
        return (await people.questions.signedIn(found.id)) ?? false
      }
      check().then((person) => done(null, person), done)
    }),
  )
  authenticator.serializeUser((user, done) => done(null, (user as SignedIn).personId))
  authenticator.deserializeUser((id: string, done) => {
    people.questions.signedIn(id).then((person) => done(null, person ?? false), done)
  })
  return authenticator
}

export interface SignInParts {
  authenticator: Authenticator
  lockout: Lockout
  people: People
  readMe: MeReader
}

function authenticate(authenticator: Authenticator, req: Request): Promise<SignedIn | null> {
  return new Promise((resolve, reject) => {
    const answer = (error: unknown, person: SignedIn | false) => {
      if (error) reject(error as Error)
      else resolve(person || null)
    }
    const middleware = authenticator.authenticate('local', answer) as (
      req: Request,
      res: unknown,
      next: () => void,
    ) => void
    middleware(req, req.res, () => resolve(null))
  })
}

const logIn = (req: Request, person: SignedIn) =>
  new Promise<void>((resolve, reject) =>
    req.logIn(person, (error) => (error ? reject(error as Error) : resolve())),
  )

const logOut = (req: Request) =>
  new Promise<void>((resolve, reject) => req.logOut((error) => (error ? reject(error as Error) : resolve())))

export function signInRoutes(parts: SignInParts): Route[] {
  const { authenticator, lockout, people, readMe } = parts
  return [
    route(contracts.signIn, async ({ body, req, context }): Promise<Me> => {
      const tried = { emailKey: body.email.toLowerCase(), address: req.ip ?? '' }
      const person = await lockout.attempt(
        tried,
        () => authenticate(authenticator, req),
        (minutes) =>
          `Wait ${String(minutes)} min, then try again, or ask an administrator for a one-time password.`,
      )
      if (!person)
        throw new Problem('sign-in-failed', {
          detail: 'Check both. 5 wrong tries lock the account for 15 minutes.',
        })
      await logIn(req, person)
      await people.service.noteSignIn({ ...context, actor: person })
      return readMe(person)
    }),
    route(contracts.signOut, async ({ req, res }) => {
      await logOut(req)
      await new Promise<void>((resolve, reject) =>
        req.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve())),
      )
      res.clearCookie('pratique.sid')
      return null
    }),
    route(contracts.getMe, async ({ req }) => readMe(mustBeSignedIn(req))),
    route(contracts.changePassword, async ({ body, context, req }) => {
      await people.service.changeOwnPassword(context, { ...body, sessionKept: req.sessionID })
      return readMe({ ...mustBeSignedIn(req), mustChangePassword: false })
    }),
    route(contracts.setPreference, async ({ params, body, context, req }) => {
      await people.service.setPreference(context, params.name, body.value)
      return readMe(mustBeSignedIn(req))
    }),
  ]
}

function mustBeSignedIn(req: Request): SignedIn {
  const person = personOf(req)
  if (!person) throw new Problem('not-signed-in')
  return person
}
