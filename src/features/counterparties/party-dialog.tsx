import { useState } from 'react'
import type { Counterparty } from '../../../shared/contracts/counterparties.contract.ts'
import { NewCounterparty } from '../../../shared/contracts/counterparties.contract.ts'
import { useForm } from 'react-hook-form'
import { counterpartyKinds } from '../../../shared/domain/register/counterparty-kinds.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { partyWords as words } from '../../../shared/messages/party-sheet.ts'
import { counterpartyKindNames } from '../../../shared/messages/register-kinds.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useCorrectParty, useEnterParty } from './mutations.ts'

interface PartyValues {
  id: string
  name: string
  kind: string
  address: string
  registration: string
  email: string
  telephone: string
  note: string
}

const valuesOf = (party: Counterparty | null): PartyValues => ({
  id: party?.id ?? newId(),
  name: party?.name ?? '',
  kind: party?.kind ?? '',
  address: party?.address ?? '',
  registration: party?.registration ?? '',
  email: party?.email ?? '',
  telephone: party?.telephone ?? '',
  note: party?.note ?? '',
})

const bodyOf = (values: PartyValues) => ({
  id: values.id,
  name: typedText(values.name),
  kind: typedText(values.kind),
  address: typedText(values.address) ?? null,
  registration: typedText(values.registration) ?? null,
  email: typedText(values.email) ?? null,
  telephone: typedText(values.telephone) ?? null,
  note: typedText(values.note) ?? null,
})

/** Enters another party, or corrects one. */
export function PartyDialog({ party, onBack }: { party: Counterparty | null; onBack: () => void }) {
  const form = useForm<PartyValues>({
    defaultValues: valuesOf(party),
    resolver: bodyResolver(NewCounterparty, bodyOf),
  })
  const enter = useEnterParty()
  const correct = useCorrectParty(party?.id ?? '')
  const [general, setGeneral] = useState<string>()
  const { errors, isDirty, isSubmitting } = form.formState
  const says = (name: keyof PartyValues) => errors[name]?.message

  const send = form.handleSubmit(async (values) => {
    setGeneral(undefined)
    const body = NewCounterparty.parse(bodyOf(values))
    const { id: _id, ...content } = body
    try {
      if (party) await correct.mutateAsync({ expectedVersion: party.version, ...content })
      else await enter.mutateAsync(body)
      onBack()
    } catch (error) {
      if (!isProblem(error)) throw error
      setGeneral(applyProblem(form, error))
    }
  })
  return (
    <Dialog
      question={party ? words.correct({ name: party.name }) : words.enter}
      typed={isDirty}
      onBack={onBack}
      wide
      acts={
        <>
          <Button kind="primary" shut={isSubmitting && formWords.sending} onClick={() => void send()}>
            {words.save}
          </Button>
          <Button onClick={onBack}>{words.back}</Button>
        </>
      }
    >
      <form className="stack" onSubmit={(event) => void send(event)}>
        <WrongSummary fields={[]} general={general} />
        <TextField label={words.name} wrong={says('name')} {...form.register('name')} />
        <SelectField
          label={words.kind}
          wrong={says('kind')}
          options={counterpartyKinds.map((kind) => ({ value: kind, label: counterpartyKindNames[kind] }))}
          {...form.register('kind')}
        />
        <TextField
          label={words.registration}
          optional
          wrong={says('registration')}
          {...form.register('registration')}
        />
        <TextareaField label={words.address} optional wrong={says('address')} {...form.register('address')} />
        <TextField label={words.email} optional wrong={says('email')} {...form.register('email')} />
        <TextField
          label={words.telephone}
          optional
          wrong={says('telephone')}
          {...form.register('telephone')}
        />
        <TextareaField label={words.note} optional wrong={says('note')} {...form.register('note')} />
      </form>
    </Dialog>
  )
}
