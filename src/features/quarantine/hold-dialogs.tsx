import { useState } from 'react'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { lockCauseWords } from '../../../shared/messages/quarantine.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { thisDevice } from '../../lib/this-device.ts'
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
import { useHoldCase, useLiftLock, useLockCase } from './mutations.ts'

/** Holds a case at once: no password, and no reason needed. */
export function HoldDialog({ number, onBack }: { number: string; onBack: () => void }) {
  const hold = useHoldCase(number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [reason, setReason] = useState('')
  const send = async () => {
    const body = {
      id,
      happenedAt: new Date().toISOString(),
      reason: typedText(reason),
      origin: 'online' as const,
      device: thisDevice(),
    }
    if (!(await refusal.attempt(() => hold.mutateAsync(body)))) return
    toast({ words: words.recorded({ number }) })
    onBack()
  }
  return (
    <Dialog
      question={words.holdQuestion({ number })}
      onBack={onBack}
      typed={reason !== ''}
      acts={
        <>
          <Button kind="hold" disabled={refusal.busy} onClick={() => void send()}>
            {words.holdAct}
          </Button>
          <Button onClick={onBack}>{words.keepRunning}</Button>
        </>
      }
    >
      <p>{words.holdBody}</p>
      <WrongSummary fields={[]} general={refusal.general([])} />
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
  const [id] = useState(newId)
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
          id,
          lockEventId: lock.eventId,
          reason,
          happenedAt: new Date().toISOString(),
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
