import { CloudOff } from 'lucide-react'
import { Link } from 'react-router-dom'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import type { OutboxItem } from '../../lib/outbox-store.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useUnsent } from '../../lib/stop-entries.ts'
import { Banner } from '../../ui/banner.tsx'

/** A stop or a hold that was entered on this device and is not with the server: said until it is. */
export function UnsentActs({
  number,
  doseId,
  zone,
  now,
}: {
  number: string
  doseId: string | null
  zone: string
  now: string
}) {
  const stop = useUnsent({ doseId })
  const hold = useUnsent({ number })
  const at = (item: OutboxItem) => ({ at: sayMoment(item.madeAt, zone, now) })
  return (
    <>
      {stop === null ? null : (
        <UnsentAct item={stop} heading={words.unsentStop(at(stop))} body={words.unsentStopBody} />
      )}
      {hold === null ? null : (
        <UnsentAct item={hold} heading={words.unsentHold(at(hold))} body={words.unsentHoldBody} />
      )}
    </>
  )
}

function UnsentAct({ item, heading, body }: { item: OutboxItem; heading: string; body: string }) {
  return (
    <Banner icon={CloudOff} act={<Link to={paths.unsent()}>{words.toUnsent}</Link>}>
      <b>{heading}</b> <span>{item.refusal === null ? body : `${words.notTaken} ${item.refusal.says}`}</span>
    </Banner>
  )
}
