import { Outlet } from 'react-router-dom'
import { useOutboxSending } from '../../lib/use-outbox.ts'
import { useWithoutSignal } from '../../lib/use-without-signal.ts'
import { WithMe } from '../with-me.tsx'

/** Around sheets for the hand: no bridge and no ruler, only the person; entries are sent from here as well. */
export function Component() {
  return (
    <WithMe>
      <HandSheet />
    </WithMe>
  )
}

function HandSheet() {
  useOutboxSending()
  useWithoutSignal()
  return <Outlet />
}
