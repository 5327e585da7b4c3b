import { useRef } from 'react'
import { Check } from 'lucide-react'
import type { HandoverNote } from '../../../shared/contracts/handover.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { handoverWords } from '../../../shared/messages/today.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { Icon } from '../../ui/icon.tsx'
import { useMarkHandoverRead } from './mutations.ts'

/** Notes of the watch before, with who has read them. */
export function HandoverNotes({
  notes,
  at,
  zone,
}: {
  notes: readonly HandoverNote[]
  at: string
  zone: string
}) {
  return notes.map((note) => <Note key={note.id} note={note} at={at} zone={zone} />)
}

function Note({ note, at, zone }: { note: HandoverNote; at: string; zone: string }) {
  const mark = useMarkHandoverRead()
  const id = useRef(newId())
  return (
    <article className="handover">
      <h3 className="handover-head">
        {note.about === null ? handoverWords.title : handoverWords.titleAbout({ about: note.about })}
        <time dateTime={note.at} className="t-note">
          {sayMoment(note.at, zone, at)}
        </time>
      </h3>
      <p>{note.words}</p>
      <p className="t-note">{note.by}</p>
      {note.readBy.length === 0 ? (
        <p className="handover-read t-note">{handoverWords.readByNobody}</p>
      ) : (
        <p className="handover-read t-note">
          <Icon of={Check} />
          {handoverWords.readBy({
            names: note.readBy.map((read) => `${read.by} ${sayMoment(read.at, zone, at)}`),
          })}
        </p>
      )}
      {isProblem(mark.error) ? <p role="alert">{mark.error.says}</p> : null}
      {note.mine || note.readByMe ? null : (
        <Button
          size="small"
          shut={mark.isPending && formWords.sending}
          onClick={() => mark.mutate({ noteId: note.id, id: id.current })}
        >
          {handoverWords.haveRead}
        </Button>
      )}
    </article>
  )
}
