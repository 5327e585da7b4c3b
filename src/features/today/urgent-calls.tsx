import { useRef } from 'react'
import { Siren } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { sayWork } from '../../../shared/messages/say-today.ts'
import { todayWords, urgentFates } from '../../../shared/messages/today.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { Icon } from '../../ui/icon.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { addressOfWork } from './address-of.ts'
import { useMarkSeen } from './mutations.ts'
import { agoText } from './today-model.ts'

interface Drawn {
  at: string
  zone: string
}

/** Urgent calls that nobody has seen, over everything else. */
export function UrgentCalls({ calls, at, zone }: Drawn & { calls: readonly TodayWork[] }) {
  if (calls.length === 0) return null
  return (
    <section className="today-urgent" aria-label={todayWords.urgent}>
      {calls.map((call) => (
        <UrgentCall key={call.id} call={call} at={at} zone={zone} />
      ))}
    </section>
  )
}

function UrgentCall({ call, at, zone }: Drawn & { call: TodayWork }) {
  const mark = useMarkSeen()
  const toast = useToast()
  const id = useRef(newId())
  const { title, note } = sayWork(call, at, zone)
  const fate = String(call.params['fate']) as keyof typeof urgentFates
  return (
    <article className="today-call">
      <Icon of={Siren} size={20} />
      <div className="min-w-0">
        <h2 className="today-call-title">
          <Link to={addressOfWork(call)}>{title}</Link>
        </h2>
        <p className="today-call-words">{note}</p>
        <p className="t-note">
          {todayWords.urgentBy({
            by: String(call.params['by'] ?? ''),
            at: call.at === null ? '' : sayMoment(call.at, zone, at),
          })}
          {', '}
          {agoText(call, at, zone)}
        </p>
        <p className={fate === 'not-sent' ? 'today-call-not-sent' : undefined}>{urgentFates[fate] ?? ''}</p>
        {isProblem(mark.error) ? <p role="alert">{mark.error.says}</p> : null}
      </div>
      {call.acts.includes('mark-seen') ? (
        <Button
          kind="primary"
          shut={mark.isPending && formWords.sending}
          onClick={() =>
            mark.mutate(
              { noticeId: String(call.params['noticeId']), id: id.current },
              { onSuccess: () => toast({ words: todayWords.seenNow }) },
            )
          }
        >
          {todayWords.markSeen}
        </Button>
      ) : null}
    </article>
  )
}
