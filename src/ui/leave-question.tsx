import { useState } from 'react'
import type { Blocker, Location } from 'react-router-dom'
import { formWords as words } from '../../shared/messages/form.ts'
import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'

/**
 * Asked before a form with unsaved text is left. It goes with the answer: the router takes the block back only when it
 * next draws, and a question that stays until then would give the focus back under the hands of whoever writes on.
 */
export function LeaveQuestion({ blocker }: { blocker: Blocker }) {
  const [answered, setAnswered] = useState<Location>()
  if (blocker.state !== 'blocked' || blocker.location === answered) return null
  const stay = () => {
    setAnswered(blocker.location)
    blocker.reset()
  }
  return (
    <Dialog
      question={words.leave}
      alert
      onBack={stay}
      acts={
        <>
          <Button kind="primary" onClick={stay}>
            {words.leaveNo}
          </Button>
          <Button onClick={() => blocker.proceed()}>{words.leaveYes}</Button>
        </>
      }
    >
      <p>{words.leaveBody}</p>
    </Dialog>
  )
}
