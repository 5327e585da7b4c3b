import { useState } from 'react'
import { useForm } from 'react-hook-form'
import type { UseFormRegister } from 'react-hook-form'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { enterLicence } from '../../../shared/contracts/people.contract.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LicenceFields, typedLicence } from './licence-fields.tsx'
import type { LicenceFieldsBody } from './licence-fields.tsx'
import { useEnterLicence } from './mutations.ts'
import { useTellUnsaved } from './use-tell-unsaved.ts'

type Body = BodyOf<typeof enterLicence>

/** Enters a licence or a registration; which of the two it is nobody presumes. */
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
    resolver: bodyResolver(enterLicence.body, (typed) => ({ id: typed.id, ...typedLicence(typed) })),
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
      <LicenceFields
        register={form.register as unknown as UseFormRegister<LicenceFieldsBody>}
        errors={errors}
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
