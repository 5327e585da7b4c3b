import { useQuery } from '@tanstack/react-query'
import { Siren } from 'lucide-react'
import { Link } from 'react-router-dom'
import { noticeStateWords } from '../../../shared/messages/notices.ts'
import { quarantineWords as words } from '../../../shared/messages/quarantine-screens.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Icon } from '../../ui/icon.tsx'
import { openNoticesQuery } from './queries.ts'

/** Urgent calls that nobody has seen yet, of one case or of all; nothing when there are none. */
export function OpenCalls({ number }: { number?: string }) {
  const { zone } = useMe().facility
  const { data = [] } = useQuery(openNoticesQuery)
  const calls = data.filter((call) => number === undefined || call.caseNumber === number)
  if (calls.length === 0) return null
  const now = new Date().toISOString()
  return (
    <section className="open-calls" aria-label={words.openCalls}>
      {calls.map((call) => (
        <p key={call.id}>
          <Icon of={Siren} size={20} />
          <span>
            <b className="t-strong">{noticeStateWords[call.state]}.</b>{' '}
            {words.openCall({
              place: call.caseNumber === null ? call.enclosure : `${call.enclosure}, ${call.caseNumber}`,
              words: call.words,
              by: call.raisedBy,
              at: sayMoment(call.raisedAt, zone, now),
            })}
          </span>
          <Link className="inline-block min-h-6" to={paths.urgentCall(call.id)}>
            {words.openTheCall}
          </Link>
        </p>
      ))}
    </section>
  )
}
