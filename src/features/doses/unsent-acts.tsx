import { useEffect, useRef } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import { CloudOff } from 'lucide-react'
import { Link } from 'react-router-dom'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import type { OutboxItem } from '../../lib/outbox-store.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useUnsent } from '../../lib/stop-entries.ts'
import { Banner } from '../../ui/banner.tsx'
import { dosesKey } from './queries.ts'

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
  useReadAgainOnceSent(stop?.id ?? null)
  useReadAgainOnceSent(hold?.id ?? null)
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

/** A stop and a hold are sent one after the other; the sheet may have been read in between, and is read again after each. */
function useReadAgainOnceSent(id: string | null): void {
  const client = useQueryClient()
  const before = useRef(id)
  useEffect(() => {
    if (before.current !== null && before.current !== id)
      void client.invalidateQueries({ queryKey: dosesKey })
    before.current = id
  }, [client, id])
}

function UnsentAct({ item, heading, body }: { item: OutboxItem; heading: string; body: string }) {
  return (
    <Banner icon={CloudOff} act={<Link to={paths.unsent()}>{words.toUnsent}</Link>}>
      <b>{heading}</b> <span>{item.refusal === null ? body : `${words.notTaken} ${item.refusal.says}`}</span>
    </Banner>
  )
}
