import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import { isBeforeStart } from '../../../shared/domain/dose/is-before-start.ts'
import { sheetWords, timerWords as words } from '../../../shared/messages/doses-screens.ts'
import { enterAndSend, refusalOf } from '../../lib/enter-and-send.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { stopEntries } from '../../lib/stop-entries.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'

/** `stop` before its time, `end` at its time, `out`: an agent that was left in the water is out of it. */
export type StopKind = 'stop' | 'end' | 'out'

const wordsOf = (kind: StopKind) =>
  ({
    stop: { question: words.stopQuestion, body: words.stopBody, act: words.stopAct, done: words.done },
    end: { question: words.endQuestion, body: words.endBody, act: words.endAct, done: words.done },
    out: { question: words.outQuestion, body: words.outBody, act: words.outAct, done: words.doneOut },
  })[kind]

/**
 * Ends a bath, with a signal or without: it is kept on the device first. Its time is the moment of the first press; no
 * password and no word is asked for.
 */
export function StopDialog({
  doseId,
  label,
  startedAt,
  kind,
  now,
  onBack,
}: {
  doseId: string
  /** The enclosure, for the list of what is not sent yet. */
  label: string
  /** When the dose went in. */
  startedAt: string
  kind: StopKind
  /** The server's time at the press. */
  now: string
  onBack: () => void
}) {
  const when = useMoment(now)
  const me = useMe()
  const client = useQueryClient()
  const [busy, setBusy] = useState(false)
  const [refused, setRefused] = useState<string>()
  const say = useToast()
  const [id] = useState(newId)
  const [seen, setSeen] = useState('')
  const [rescue, setRescue] = useState('')
  const its = wordsOf(kind)
  const [sure, setSure] = useState(false)
  const isEarly = when.instant !== null && isBeforeStart(when.instant, startedAt)
  const wrongTime =
    when.missing ?? (isEarly ? words.beforeStart({ at: sayMoment(startedAt, when.zone, now) }) : undefined)

  const send = async () => {
    if (when.instant === null) return
    const happenedAt = when.instant
    const typed = { seen: typedText(seen), rescue: typedText(rescue) }
    setBusy(true)
    const fate = await enterAndSend(
      client,
      stopEntries.stopBath(me.id, label, doseId, {
        id,
        cause: kind === 'stop' ? 'stopped' : 'time-up',
        happenedAt,
        ...(typed.seen === undefined ? {} : { seen: typed.seen }),
        ...(typed.rescue === undefined ? {} : { rescue: typed.rescue }),
      }),
      [[]],
    )
    setBusy(false)
    if (fate === 'refused') return setRefused(refusalOf(id))
    const kept = kind === 'stop' ? sheetWords.keptStop : sheetWords.keptEnd
    say({ words: fate === 'kept' ? kept : kind === 'stop' ? words.stopped : words.ended })
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
            disabled={busy}
            shut={when.missing ?? (isEarly && !sure ? words.shutBeforeStart : false)}
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
        <WrongSummary fields={[]} general={refused} />
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
        <MomentField label={words.when} value={when.moment} onChange={when.setMoment} wrong={wrongTime} />
        {isEarly ? (
          <Tick
            label={words.keepBeforeStart}
            checked={sure}
            onChange={(event) => setSure(event.target.checked)}
          />
        ) : null}
      </div>
    </Dialog>
  )
}
