import { useState } from 'react'
import { timerWords as words } from '../../../shared/messages/doses-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useStopBath } from './mutations.ts'

/** `stop` before its time, `end` at its time, `out`: an agent that was left in the water is out of it. */
export type StopKind = 'stop' | 'end' | 'out'

const wordsOf = (kind: StopKind) =>
  ({
    stop: { question: words.stopQuestion, body: words.stopBody, act: words.stopAct, done: words.done },
    end: { question: words.endQuestion, body: words.endBody, act: words.endAct, done: words.done },
    out: { question: words.outQuestion, body: words.outBody, act: words.outAct, done: words.doneOut },
  })[kind]

/** Ends a bath. Its time is the moment of the first press; no password and no word is asked for. */
export function StopDialog({
  doseId,
  kind,
  now,
  onBack,
}: {
  doseId: string
  kind: StopKind
  /** The server's time at the press. */
  now: string
  onBack: () => void
}) {
  const when = useMoment(now)
  const stop = useStopBath()
  const refusal = useRefusal()
  const say = useToast()
  const [id] = useState(newId)
  const [seen, setSeen] = useState('')
  const [rescue, setRescue] = useState('')
  const its = wordsOf(kind)

  const send = async () => {
    if (when.instant === null) return
    const happenedAt = when.instant
    const typed = { seen: typedText(seen), rescue: typedText(rescue) }
    const done = await refusal.attempt(() =>
      stop.mutateAsync({
        doseId,
        id,
        cause: kind === 'stop' ? 'stopped' : 'time-up',
        happenedAt,
        ...(typed.seen === undefined ? {} : { seen: typed.seen }),
        ...(typed.rescue === undefined ? {} : { rescue: typed.rescue }),
      }),
    )
    if (!done) return
    say({ words: kind === 'stop' ? words.stopped : words.ended })
    onBack()
  }

  return (
    <Dialog
      question={its.question}
      alert={kind === 'stop'}
      typed={seen !== '' || rescue !== ''}
      onBack={onBack}
      acts={
        <>
          <Button
            kind={kind === 'stop' ? 'stop' : 'primary'}
            size="touch"
            disabled={refusal.busy}
            shut={when.missing ?? false}
            onClick={() => void send()}
          >
            {its.act}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.stopBack}
          </Button>
        </>
      }
    >
      <div className="stack">
        <p>{its.body}</p>
        <WrongSummary fields={[]} general={refusal.general(['/happenedAt'])} />
        {kind === 'out' ? null : (
          <TextareaField
            label={words.seen}
            optional
            rows={2}
            maxLength={1000}
            value={seen}
            onChange={(event) => setSeen(event.target.value)}
          />
        )}
        <TextareaField
          label={its.done}
          optional
          rows={2}
          maxLength={1000}
          value={rescue}
          onChange={(event) => setRescue(event.target.value)}
        />
        <MomentField
          label={words.when}
          value={when.moment}
          onChange={when.setMoment}
          wrong={when.missing ?? refusal.at('/happenedAt')}
        />
      </div>
    </Dialog>
  )
}
