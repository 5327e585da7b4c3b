import type { Blocker } from 'react-router-dom'
import { formWords as words } from '../../shared/messages/form.ts'
import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'

/** Asked before a form with unsaved text is left. */
export function LeaveQuestion({ blocker }: { blocker: Blocker }) {
  if (blocker.state !== 'blocked') return null
  return (
    <Dialog
      question={words.leave}
      alert
      onBack={() => blocker.reset()}
      acts={
        <>
          <Button kind="primary" onClick={() => blocker.reset()}>
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
