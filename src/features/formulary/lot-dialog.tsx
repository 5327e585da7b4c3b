import { useState } from 'react'
import type { Lot } from '../../../shared/contracts/formulary.contract.ts'
import { formularyWords as words, lotEventNames } from '../../../shared/messages/formulary-screens.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { newId } from '../../lib/new-id.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useNoteLot } from './mutations.ts'

type Kind = keyof typeof lotEventNames
const kinds = Object.keys(lotEventNames) as Kind[]

/** What happened to a lot, with its own time: looked at, a precipitate, kept too cold, recalled … */
export function LotDialog({ lot, onDone }: { lot: Lot; onDone: () => void }) {
  const [id] = useState(newId)
  const [kind, setKind] = useState<Kind | ''>('')
  const [note, setNote] = useState('')
  const [tried, setTried] = useState(false)
  const when = useMoment()
  const act = useNoteLot(lot.id)
  const refusal = useRefusal()
  const say = useToast()
  const send = async () => {
    setTried(true)
    const happenedAt = when.instant
    if (kind === '' || happenedAt === null) return
    const body = { id, kind, happenedAt, ...(note.trim() ? { note: note.trim() } : {}) }
    if (!(await refusal.attempt(() => act.mutateAsync(body)))) return
    say({ words: words.noted })
    onDone()
  }
  return (
    <Dialog
      question={words.noteQuestion({ lot: lot.lotNumber })}
      typed={note !== '' || kind !== ''}
      onBack={onDone}
      acts={
        <>
          <Button kind="primary" shut={refusal.busy && formWords.sending} onClick={() => void send()}>
            {words.noteAct}
          </Button>
          <Button onClick={onDone}>{words.noteBack}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refusal.general(['/happenedAt', '/note'])} />
        <SelectField
          label={words.noteKind}
          options={kinds.map((value) => ({ value, label: lotEventNames[value] }))}
          value={kind}
          wrong={tried && kind === '' ? words.noteNeeded : undefined}
          onChange={(event) => setKind(event.target.value as Kind | '')}
        />
        <MomentField
          label={words.noteWhen}
          value={when.moment}
          wrong={when.missing ?? refusal.at('/happenedAt')}
          onChange={when.setMoment}
        />
        <TextareaField
          label={words.noteWords}
          optional
          rows={2}
          maxLength={500}
          value={note}
          wrong={refusal.at('/note')}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
    </Dialog>
  )
}
