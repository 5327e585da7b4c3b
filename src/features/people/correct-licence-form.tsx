import { useState } from 'react'
import { useForm } from 'react-hook-form'
import type { UseFormRegister } from 'react-hook-form'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { correctLicence } from '../../../shared/contracts/people.contract.ts'
import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { peopleWords as words } from '../../../shared/messages/people.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LicenceFields, typedLicence } from './licence-fields.tsx'
import type { LicenceFieldsBody } from './licence-fields.tsx'
import { useCorrectLicence } from './mutations.ts'
import { useTellUnsaved } from './use-tell-unsaved.ts'

type Body = BodyOf<typeof correctLicence>

/** Another entry in the place of a licence, begun as the one that stands; the earlier one stays readable. */
export function CorrectLicenceForm({
  personId,
  licence,
  onDone,
  onUnsaved,
}: {
  personId: string
  licence: Licence
  onDone: () => void
  onUnsaved: (unsaved: boolean) => void
}) {
  const [id] = useState(newId)
  const [refused, setRefused] = useState<string | undefined>()
  const correct = useCorrectLicence(personId, licence.id)
  const form = useForm<Body>({
    resolver: bodyResolver(correctLicence.body, (typed) => ({
      id: typed.id,
      reason: typedText(typed.reason),
      ...typedLicence(typed),
    })),
    defaultValues: {
      id,
      class: licence.class,
      jurisdiction: licence.jurisdiction,
      number: licence.number,
      validFrom: licence.validFrom,
      validUntil: licence.validUntil,
      reason: '',
    },
  })
  const { errors, isDirty } = form.formState
  useTellUnsaved(isDirty, onUnsaved)
  const submit = form.handleSubmit((typed) => {
    setRefused(undefined)
    correct.mutate(typed, {
      onSuccess: onDone,
      onError: (error) => {
        if (isProblem(error)) setRefused(applyProblem(form, error))
      },
    })
  })
  return (
    <form className="stack max-w-[460px] border-2 border-ink p-4" noValidate onSubmit={submit}>
      <h3 className="t-head">{words.correctTitle({ number: licence.number })}</h3>
      <p className="hint">{words.correctHint}</p>
      <WrongSummary fields={[]} general={refused} />
      <LicenceFields
        register={form.register as unknown as UseFormRegister<LicenceFieldsBody>}
        errors={errors}
      />
      <TextField label={words.correctReason} wrong={errors.reason?.message} {...form.register('reason')} />
      <div className="row row-wrap">
        <Button kind="primary" type="submit" disabled={correct.isPending}>
          {words.correctAct}
        </Button>
        <Button onClick={onDone}>{words.goBack}</Button>
      </div>
    </form>
  )
}
