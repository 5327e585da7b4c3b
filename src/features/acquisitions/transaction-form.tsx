import { useState } from 'react'
import { FormProvider, useForm } from 'react-hook-form'
import { NewAcquisition, NewDisposition } from '../../../shared/contracts/acquisition-bodies.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { listFaults } from '../../lib/form-faults.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { paperFaults } from '../documents/index.ts'
import { faultLabel } from './fault-labels.ts'
import { LinesFields } from './lines-fields.tsx'
import { useRecordAcquisition, useRecordDisposition } from './mutations.ts'
import type { Recorded } from './mutations.ts'
import { PapersFields } from './papers-fields.tsx'
import { PartyFields } from './party-fields.tsx'
import { PermitUseFields } from './permit-use-fields.tsx'
import { PlaceFields, TransportFields } from './place-and-transport.tsx'
import { acquisitionBody, blankTransaction, dispositionBody, ownFaults } from './transaction-form-model.ts'
import type { TransactionValues } from './transaction-form-model.ts'
import { WhenFields } from './when-fields.tsx'

const papersMissing = (values: TransactionValues) =>
  values.papers.flatMap((paper, i) =>
    Object.keys(paperFaults(paper)).map((name) => `papers.${String(i)}.${name}`),
  )

/** Records that animals came or left, with permits and papers. What was typed stays until it is saved. */
export function TransactionForm({
  way,
  onRecorded,
}: {
  way: 'in' | 'out'
  onRecorded: (recorded: Recorded) => void
}) {
  const { zone } = useMe().facility
  const may = useMay('register.manage')
  const bodyOf = (values: TransactionValues) =>
    way === 'in' ? acquisitionBody(values, zone) : dispositionBody(values, zone)
  const form = useForm<TransactionValues>({
    defaultValues: blankTransaction(),
    resolver: bodyResolver<TransactionValues>(
      way === 'in' ? NewAcquisition : NewDisposition,
      bodyOf,
      (values) => [...ownFaults(values, way), ...papersMissing(values)],
    ),
  })
  const acquire = useRecordAcquisition()
  const dispose = useRecordDisposition()
  const [general, setGeneral] = useState<string>()
  const { errors, isSubmitting, isDirty } = form.formState
  // while it is being sent, what follows may lead away
  const { blocker } = useLeaveGuard(isDirty && !isSubmitting)

  const send = form.handleSubmit(async (values) => {
    setGeneral(undefined)
    const { papers } = values
    try {
      const body = bodyOf(values)
      onRecorded(
        way === 'in'
          ? await acquire.mutateAsync({ body: NewAcquisition.parse(body), papers })
          : await dispose.mutateAsync({ body: NewDisposition.parse(body), papers }),
      )
    } catch (error) {
      if (!isProblem(error)) throw error
      const left = applyProblem(form, error)
      // a rule of permits or locks is said as a whole as well: it tells what can be done
      setGeneral(error.status === 409 ? error.says : left)
    }
  })

  return (
    <FormProvider {...form}>
      <form className="stack gap-6 form-column" noValidate onSubmit={(event) => void send(event)}>
        <WrongSummary fields={listFaults(errors, faultLabel)} general={general} />
        <div className="stack gap-4">
          <WhenFields way={way} />
          <PartyFields />
        </div>
        <LinesFields way={way} />
        <PermitUseFields />
        <div className="stack">
          <PlaceFields way={way} />
          <TransportFields />
        </div>
        <PapersFields />
        <TextareaField label={words.note} optional {...form.register('note')} />
        <div>
          <Button
            kind="primary"
            type="submit"
            shut={may.allowed ? isSubmitting && formWords.sending : words.mayNot}
          >
            {way === 'in' ? words.save : words.saveOut}
          </Button>
        </div>
      </form>
      <LeaveQuestion blocker={blocker} />
    </FormProvider>
  )
}
