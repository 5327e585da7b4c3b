import { CloudOff } from 'lucide-react'
import { Link } from 'react-router-dom'
import { frameWords } from '../../../shared/messages/frame.ts'
import { paths } from '../../lib/paths.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { Icon } from '../../ui/icon.tsx'

/** In the bridge while entries of this device are not with the server: how many, and where they are. */
export function UnsentMark({ short }: { short: boolean }) {
  const { waiting, refused } = useOutbox()
  const count = waiting.length + refused.length
  if (count === 0) return null
  return (
    <Link className="ghost unsent-mark" to={paths.unsent()} aria-label={frameWords.unsent({ count })}>
      <Icon of={CloudOff} size={short ? 20 : 16} />
      {short ? <b>{count}</b> : frameWords.unsent({ count })}
    </Link>
  )
}
