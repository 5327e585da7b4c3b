import { useQueryClient } from '@tanstack/react-query'
import { differentPersonWords as words } from '../../shared/messages/different-person.ts'
import { useMe } from '../lib/me.ts'
import { usePagePerson } from '../lib/page-person.ts'
import { meKey } from '../lib/query-client.ts'
import { Button } from '../ui/button.tsx'
import { Dialog } from '../ui/dialog.tsx'

/**
 * Over a page that was left open while somebody else signed in on this browser: nothing can be written from it, and what
 * was typed stays below until its writer is back or the page is loaded for whoever is there now.
 */
export function OtherPerson() {
  const me = useMe()
  const { other } = usePagePerson()
  const client = useQueryClient()
  if (other === null) return null
  const names = { before: me.printedName, now: other }
  const lookAgain = () => void client.invalidateQueries({ queryKey: meKey })
  return (
    <Dialog
      alert
      question={words.question(names)}
      onBack={lookAgain}
      acts={
        <>
          <Button kind="primary" onClick={() => window.location.reload()}>
            {words.goOn(names)}
          </Button>
          <Button onClick={lookAgain}>{words.lookAgain}</Button>
        </>
      }
    >
      <p>{words.body(names)}</p>
      <p>{words.keep(names)}</p>
    </Dialog>
  )
}
