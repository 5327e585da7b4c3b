import type { PermitRow } from '../../../shared/contracts/permits.contract.ts'
import { permitWords as words } from '../../../shared/messages/permits-sheet.ts'
import { permitStateNames } from '../../../shared/messages/register-kinds.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'

/** Valid or not, as a flag with its words, and how long it still holds. */
export function PermitState({ permit }: { permit: Pick<PermitRow, 'state' | 'daysLeft'> }) {
  const good = permit.state === 'valid' || permit.state === 'runs-out'
  const days =
    permit.state === 'runs-out'
      ? words.daysLeft({ days: permit.daysLeft })
      : permit.state === 'expired'
        ? words.daysAgo({ days: -permit.daysLeft })
        : null
  return (
    <FlagWords flag={good ? 'C' : 'N'}>
      {permitStateNames[permit.state]}
      {days === null ? '' : `, ${days}`}
    </FlagWords>
  )
}
