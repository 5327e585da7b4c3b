import { useEffect, useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import type { ControlledSchedule } from '../../../shared/domain/licences/controlled-agents.ts'
import { signingWords } from '../../../shared/messages/signing.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { useMe } from '../../lib/me.ts'
import { meKey } from '../../lib/query-client.ts'
import { isLocked, signingOf } from './signer-model.ts'
import type { Signing } from './signer-model.ts'

export interface Signer extends Signing {
  me: Me
  schedule: ControlledSchedule | null
  /** Until when signing is locked after wrong passwords; null when it is not. */
  lockedUntil: string | null
  /** Why nothing can be signed as it stands; undefined when it can. */
  shut: string | undefined
  /** The licence as it is sent: the one that stands on the screen is the one that signs. */
  licenceId: string | undefined
  choose: (id: string) => void
  /** Reads anew what is known of the signer: after a refusal, a licence may have ended or signing be locked. */
  readAgain: () => void
}

/**
 * Who is about to sign, under which licence, and what stands against it, for every form that asks for a signature.
 *
 * @param schedule schedule of the controlled drug that is signed for; null of everything else
 */
export function useSigner(schedule: ControlledSchedule | null = null): Signer {
  const me = useMe()
  const client = useQueryClient()
  const { zone } = me.facility
  const now = useFacilityNow(zone)
  const [chosenId, choose] = useState<string | null>(null)
  const [readOn, setReadOn] = useState(now.date)
  const readAgain = () => void client.invalidateQueries({ queryKey: meKey })
  // a form that is open over midnight stands on another day, on which another licence may be the one that counts
  useEffect(() => {
    if (readOn === now.date) return
    setReadOn(now.date)
    void client.invalidateQueries({ queryKey: meKey })
  }, [client, readOn, now.date])
  const signing = signingOf(me.licences, { on: now.date, chosenId, schedule })
  const lockedUntil = isLocked(me.signingLockedUntil, now, zone) ? me.signingLockedUntil : null
  return {
    ...signing,
    me,
    schedule,
    lockedUntil,
    shut:
      lockedUntil !== null
        ? signingWords.shutLocked
        : signing.lacks.length > 0
          ? signingWords.shutLacks
          : signing.isToChoose
            ? signingWords.chooseFirst
            : undefined,
    licenceId: signing.licence?.id,
    choose,
    readAgain,
  }
}
