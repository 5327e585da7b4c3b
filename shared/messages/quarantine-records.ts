import type { LockCause } from '../domain/quarantine/case-clock.ts'
import { defineMessages } from './define-messages.ts'

/** In place of clinical words, for whoever reads no charts. */
export const clinicalWords = defineMessages({ withheld: 'not shown to you' })

const causes = defineMessages({
  positive: 'Positive result in quarantine',
  'notifiable-suspicion': 'Suspicion of a notifiable disease',
  veterinarian: 'Locked by a veterinarian',
  held: 'Case held',
  recall: 'Recalled after clearance',
} satisfies Record<LockCause, string>)

const sentences = defineMessages({
  inQuarantine: 'In quarantine',
  lifted: 'Ended with the case or its lock',
})

/** Reasons that quarantine writes into other ledgers. */
export const quarantineRecords = {
  get inQuarantine() {
    return sentences.inQuarantine
  },
  get lifted() {
    return sentences.lifted
  },
  lockedBy: causes,
}
