import { CalendarClock } from 'lucide-react'
import { sayLicenceNotice } from '../../../shared/messages/signing.ts'
import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { Icon } from '../../ui/icon.tsx'

/** That a licence ends soon, or has ended: in words, and magenta once it is over. */
export function LicenceNoticeLine({
  licence,
}: {
  licence: Pick<Licence, 'class' | 'number' | 'jurisdiction' | 'lastDay' | 'warning'>
}) {
  const { warning } = licence
  if (warning === null) return null
  return (
    <p
      className={
        warning.level === 'ended' ? 'row items-start text-magenta t-strong' : 'row items-start t-strong'
      }
    >
      <Icon of={CalendarClock} />
      <span>{sayLicenceNotice({ ...licence, daysLeft: warning.daysLeft })}</span>
    </p>
  )
}
