import { useState } from 'react'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { instantOfMoment } from '../../lib/local-moment.ts'
import { newId } from '../../lib/new-id.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { MomentField } from '../../ui/moment-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog, WhenField } from '../animals/index.ts'
import { BatchAnimalChooser } from './batch-animal-chooser.tsx'
import { useAddMember, useCloseCase } from './mutations.ts'

/** The last of the batch is in: the count begins. */
export function CloseDialog({ number, onBack }: { number: string; onBack: () => void }) {
  const when = useMoment()
  const close = useCloseCase(number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const send = async () => {
    if (when.instant === null) return
    const body = { id, happenedAt: when.instant }
    if (!(await refusal.attempt(() => close.mutateAsync(body)))) return
    toast({ words: words.recorded({ number }) })
    onBack()
  }
  return (
    <RecordDialog
      question={words.closeQuestion({ number })}
      act={words.closeAct}
      shut={when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt'])}
      typed={false}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p>{words.closeBody}</p>
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}

/** Another animal or group of the batch has come in. */
export function MemberDialog({ number, zone, onBack }: { number: string; zone: string; onBack: () => void }) {
  const add = useAddMember(number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [accession, setAccession] = useState<string | null>(null)
  const [moment, setMoment] = useState('')
  const send = async () => {
    if (accession === null) return
    const happenedAt = moment === '' ? undefined : (instantOfMoment(moment, zone) ?? undefined)
    if (!(await refusal.attempt(() => add.mutateAsync({ id, accession, happenedAt })))) return
    toast({ words: words.recorded({ number }) })
    onBack()
  }
  return (
    <RecordDialog
      question={words.memberQuestion({ number })}
      act={words.memberAct}
      shut={accession === null ? words.chooseAnimal : undefined}
      busy={refusal.busy}
      refused={refusal.general(['/accession', '/happenedAt'])}
      typed={accession !== null}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <BatchAnimalChooser
        label={words.memberAnimal}
        wrong={refusal.at('/accession')}
        onChoose={(animal) => setAccession(animal?.accession ?? null)}
      />
      <MomentField
        label={words.memberWhen}
        hint={words.memberWhenHint}
        wrong={refusal.at('/happenedAt')}
        value={moment}
        onChange={setMoment}
      />
    </RecordDialog>
  )
}
