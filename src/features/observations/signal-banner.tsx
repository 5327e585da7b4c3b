import { CloudOff, WifiOff } from 'lucide-react'
import { Link } from 'react-router-dom'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { Banner } from '../../ui/banner.tsx'

/** Says that there is no signal and since when, how many entries wait, and that they are kept; nothing while all is well. */
export function SignalBanner() {
  const { zone } = useMe().facility
  const { waiting, refused, downSince, durable } = useOutbox()
  if (downSince === null && waiting.length === 0 && refused.length === 0) return null
  const now = new Date().toISOString()
  return (
    <Banner
      icon={downSince === null ? CloudOff : WifiOff}
      act={waiting.length + refused.length > 0 ? <Link to={paths.unsent()}>{words.lookAt}</Link> : undefined}
    >
      {downSince === null ? null : <b>{words.noSignal({ at: sayMoment(downSince, zone, now) })} </b>}
      {waiting.length > 0 ? <span>{words.waitHere({ count: waiting.length })} </span> : null}
      {refused.length > 0 ? <span>{words.refusedHere({ count: refused.length })} </span> : null}
      {durable ? null : <span>{words.notDurable}</span>}
    </Banner>
  )
}
