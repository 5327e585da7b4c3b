import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { lockCauseWords } from '../../../shared/messages/quarantine.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { observationWords } from '../../../shared/messages/observation-screens.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { RecordDialog, shortestReason, WhenField } from '../animals/index.ts'
import { enterAndSend, entries, refusalOf } from '../observations/index.ts'
import { useLiftLock, useLockCase } from './mutations.ts'

/** Holds a case at once: no password, no reason needed, and without a signal too. */
export function HoldDialog({ number, onBack }: { number: string; onBack: () => void }) {
  const me = useMe()
  const client = useQueryClient()
  const toast = useToast()
  const [reason, setReason] = useState('')
  const [busy, setBusy] = useState(false)
  const [refused, setRefused] = useState<string>()
  const send = async () => {
    setBusy(true)
    const entry = entries.hold(me.id, number, typedText(reason))
    const fate = await enterAndSend(client, entry)
    setBusy(false)
    if (fate === 'refused') return setRefused(refusalOf(entry.id))
    toast({
      words: fate === 'sent' ? words.recorded({ number }) : observationWords.holdKept({ number }),
    })
    onBack()
  }
  return (
    <Dialog
      question={words.holdQuestion({ number })}
      onBack={onBack}
      typed={reason !== ''}
      acts={
        <>
          <Button kind="hold" disabled={busy} onClick={() => void send()}>
            {words.holdAct}
          </Button>
          <Button onClick={onBack}>{words.keepRunning}</Button>
        </>
      }
    >
      <p>{words.holdBody}</p>
      <WrongSummary fields={[]} general={refused} />
      <TextareaField
        label={words.reason}
        optional
        value={reason}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => setReason(target.value)}
      />
    </Dialog>
  )
}

/** Lifts a hold or a lock; a veterinarian gives the reason. */
export function LiftDialog({
  number,
  lock,
  onBack,
}: {
  number: string
  lock: CaseDetail['locks'][number]
  onBack: () => void
}) {
  const lift = useLiftLock(number)
  const toast = useToast()
  const [given] = useState(() => ({ id: newId(), happenedAt: new Date().toISOString() }))
  return (
    <ReasonDialog
      question={words.liftQuestion({ cause: lockCauseWords[lock.cause] })}
      body={words.liftBody}
      label={words.reason}
      act={words.liftAct}
      back={words.leaveIt}
      onBack={onBack}
      onAct={async (reason) => {
        await lift.mutateAsync({
          ...given,
          lockEventId: lock.eventId,
          reason,
        })
        toast({ words: words.recorded({ number }) })
        onBack()
      }}
    />
  )
}

/** Locks a case, with its cause and reason. */
export function LockDialog({ number, onBack }: { number: string; onBack: () => void }) {
  const when = useMoment()
  const lock = useLockCase(number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [cause, setCause] = useState<'notifiable-suspicion' | 'veterinarian' | null>(null)
  const [reason, setReason] = useState('')
  const send = async () => {
    if (cause === null || when.instant === null) return
    const body = { id, cause, reason: reason.trim(), happenedAt: when.instant }
    if (!(await refusal.attempt(() => lock.mutateAsync(body)))) return
    toast({ words: words.recorded({ number }) })
    onBack()
  }
  return (
    <RecordDialog
      question={words.lockQuestion({ number })}
      act={words.lockAct}
      shut={
        cause === null
          ? words.chooseKind
          : reason.trim().length < shortestReason
            ? words.typeReason
            : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt'])}
      typed={cause !== null || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p>{words.lockBody}</p>
      <ChoiceField
        label={words.lockCause}
        segments={[
          { value: 'notifiable-suspicion', label: words.suspicion },
          { value: 'veterinarian', label: words.otherCause },
        ]}
        value={cause}
        onChange={setCause}
      />
      <TextareaField
        label={words.reason}
        value={reason}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => setReason(target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
