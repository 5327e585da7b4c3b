import { Problem } from '../http/problem.ts'
import type { Lockout } from './lockout.ts'
import { isPassword } from './passwords.ts'

/** Asks somebody who is signed in for their own password once more. */
export interface OwnPassword {
  /**
   * @param refusal what a wrong one is answered with
   * @refuses sign-in-locked, password-wrong
   */
  confirm(personId: string, typed: string, refusal: { pointer: string; detail: string }): Promise<void>
}

/**
 * Wrong ones count towards one lock of the person, whatever asks for the password and wherever they are: whoever finds a
 * page left open does not get further tries by going to another form.
 */
export function createOwnPassword(parts: {
  lockout: Lockout
  readPasswordHash(personId: string): Promise<string | null>
}): OwnPassword {
  return {
    async confirm(personId, typed, { pointer, detail }) {
      const tried = { emailKey: `own:${personId}`, address: '' }
      const right = await parts.lockout.attempt(
        tried,
        async () => {
          const hash = await parts.readPasswordHash(personId)
          if (hash === null) throw new Problem('not-signed-in')
          return (await isPassword(hash, typed)) || null
        },
        (minutes) => `Wait ${String(minutes)} min before you type your password again.`,
      )
      if (!right)
        throw new Problem('password-wrong', {
          detail,
          errors: [{ pointer, detail: 'That is not your password.' }],
        })
    },
  }
}
