import { useState } from 'react'
import { Paperclip } from 'lucide-react'
import { formWords } from '../../../shared/messages/form.ts'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { useAttachLeft } from './mutations.ts'
import type { Recorded } from './mutations.ts'

/** The transaction is recorded, but some papers are not attached yet: says which and why, and sends them again. */
export function PapersLeft({ recorded, onDone }: { recorded: Recorded; onDone: (number: string) => void }) {
  const [now, setNow] = useState(recorded)
  const attach = useAttachLeft()
  const { number } = now.transaction
  const again = () =>
    attach.mutate(now, {
      onSuccess: (next) => (next.left.length === 0 ? onDone(number) : setNow(next)),
    })
  return (
    <div className="stack gap-4 form-column" role="alert">
      <p className="t-head">{words.recordedBut({ number, left: now.left.length })}</p>
      <ul className="stack">
        {now.left.map(({ paper, says }) => (
          <li key={paper.id}>
            <b>{paper.title}</b>: {says}
          </li>
        ))}
      </ul>
      <div className="row row-wrap">
        <Button kind="primary" icon={Paperclip} shut={attach.isPending && formWords.sending} onClick={again}>
          {words.attachAgain}
        </Button>
        <ButtonLink to={paths.transaction(number)}>{words.goTo({ number })}</ButtonLink>
      </div>
    </div>
  )
}
