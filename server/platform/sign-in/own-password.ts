import { signingWords } from '../../../shared/messages/signing.ts'
import type { Clock } from '../clock.ts'
import { Problem } from '../http/problem.ts'
import type { RequestContext } from '../http/request-context.ts'
import { createTurns } from '../in-turn.ts'
import { isPassword } from './passwords.ts'
import type { SigningLock } from './signing-lock.ts'

/** Asks somebody who is signed in for their own password once more. */
export interface OwnPassword {
  /**
   * @param refusal what a wrong one is answered with
   * @refuses sign-in-locked, password-wrong
   */
  confirm(context: RequestContext, typed: string, refusal: { pointer: string; detail: string }): Promise<void>
  /** For what is confirmed by signing in alone. @refuses sign-in-locked */
  refuseWhileLocked(personId: string): Promise<void>
}

/**
 * Wrong ones count towards one lock of the person, whatever asks for the password and wherever they are: whoever finds a
 * page left open does not get further tries by going to another form.
 */
export function createOwnPassword(parts: {
  signingLock: SigningLock
  clock: Clock
  readPasswordHash(personId: string): Promise<string | null>
}): OwnPassword {
  const { signingLock, clock } = parts
  const inTurn = createTurns()
  const secondsTo = (until: Date) => Math.ceil((until.getTime() - clock.now().getTime()) / 1000)
  const minutesTo = (until: Date) => Math.ceil(secondsTo(until) / 60)
  const saidLock = (until: Date) => ({
    retry_after_seconds: minutesTo(until) * 60,
    locked_until: until.toISOString(),
  })

  function refuse(until: Date | null): void {
    if (until === null) return
    throw new Problem('sign-in-locked', {
      detail: signingWords.lockedFor({ minutes: minutesTo(until) }),
      extra: saidLock(until),
    })
  }

  return {
    refuseWhileLocked: async (personId) => refuse(await signingLock.lockedUntil(personId)),
    async confirm(context, typed, { pointer, detail }) {
      const { personId } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      // one after another in this process: right ones typed at the same moment do not count against each other
      await inTurn(personId, async () => {
        refuse(await signingLock.reserve(context, personId))
        const hash = await parts.readPasswordHash(personId)
        if (hash === null) throw new Problem('not-signed-in')
        if (await isPassword(hash, typed)) return signingLock.noteRight(personId)
        const until = await signingLock.noteWrong(context, personId)
        const says = until === null ? detail : signingWords.lockedNow({ minutes: minutesTo(until) })
        throw new Problem('password-wrong', {
          detail: says,
          errors: [
            {
              pointer,
              detail: until === null ? signingWords.passwordWrong : `${signingWords.passwordWrong} ${says}`,
            },
          ],
          ...(until === null ? {} : { extra: saidLock(until) }),
        })
      })
    },
  }
}
