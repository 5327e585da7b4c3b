import { useState } from 'react'
import { useForm } from 'react-hook-form'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { enterLicence } from '../../../shared/contracts/people.contract.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useEnterLicence } from './mutations.ts'
import { useTellUnsaved } from './use-tell-unsaved.ts'

type Body = BodyOf<typeof enterLicence>

/** A licence as it stands on paper: who granted it, number, first and last day. */
export function LicenceForm({
  personId,
  onDone,
  onUnsaved,
}: {
  personId: string
  onDone: () => void
  onUnsaved: (unsaved: boolean) => void
}) {
  const [id] = useState(newId)
  const [refused, setRefused] = useState<string | undefined>()
  const enter = useEnterLicence(personId)
  const form = useForm<Body>({
    resolver: bodyResolver(enterLicence.body, (typed) => ({
      id: typed.id,
      jurisdiction: typedText(typed.jurisdiction),
      number: typedText(typed.number),
      validFrom: typedText(typed.validFrom),
      validUntil: typedText(typed.validUntil),
    })),
    defaultValues: { id, jurisdiction: '', number: '', validFrom: '', validUntil: '' },
  })
  const { errors, isDirty } = form.formState
  useTellUnsaved(isDirty, onUnsaved)
  const submit = form.handleSubmit((typed) => {
    setRefused(undefined)
    enter.mutate(typed, {
      onSuccess: onDone,
      onError: (error) => {
        if (isProblem(error)) setRefused(applyProblem(form, error))
      },
    })
  })
  return (
    <form className="stack max-w-[460px]" noValidate onSubmit={submit}>
      <WrongSummary fields={[]} general={refused} />
      <TextField
        label={peopleWords.jurisdiction}
        hint={peopleWords.jurisdictionHint}
        wrong={errors.jurisdiction?.message}
        {...form.register('jurisdiction')}
      />
      <TextField label={peopleWords.number} wrong={errors.number?.message} {...form.register('number')} />
      <TextField
        label={peopleWords.validFrom}
        type="date"
        wrong={errors.validFrom?.message}
        {...form.register('validFrom')}
      />
      <TextField
        label={peopleWords.validUntil}
        type="date"
        wrong={errors.validUntil?.message}
        {...form.register('validUntil')}
      />
      <div className="row row-wrap">
        <Button kind="primary" type="submit" disabled={enter.isPending}>
          {peopleWords.addLicence}
        </Button>
        <Button onClick={onDone}>{peopleWords.goBack}</Button>
      </div>
    </form>
  )
}
