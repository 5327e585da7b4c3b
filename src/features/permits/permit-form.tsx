import { useState } from 'react'
import { X } from 'lucide-react'
import { Controller, useForm } from 'react-hook-form'
import { useQuery } from '@tanstack/react-query'
import { NewPermit } from '../../../shared/contracts/permits.contract.ts'
import type { Permit } from '../../../shared/contracts/permits.contract.ts'
import { permitKinds, purposeCodes } from '../../../shared/domain/register/permit-kinds.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { permitWords as words } from '../../../shared/messages/permits-sheet.ts'
import { permitKindNames, purposeCodeNames } from '../../../shared/messages/register-kinds.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { listFaults } from '../../lib/form-faults.ts'
import { useMay } from '../../lib/may.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { Icon } from '../../ui/icon.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { everyTaxon, TaxonChooser } from '../animals/index.ts'
import { PartyChooser } from '../counterparties/index.ts'
import { useEnterPermit } from './mutations.ts'
import { blankPermit, permitBody } from './permit-form-model.ts'
import type { PermitValues } from './permit-form-model.ts'

const labels: Partial<Record<keyof PermitValues, () => string>> = {
  permitNumber: () => words.permitNumber,
  authority: () => words.authority,
  kind: () => words.kind,
  validFrom: () => words.validFrom,
  validUntil: () => words.validUntil,
  quantityAllowed: () => words.quantity,
  taxonIds: () => words.taxa,
  conditions: () => words.conditions,
}

/** A permit as it is printed. */
export function PermitForm({ onEntered }: { onEntered: (permit: Permit) => void }) {
  const form = useForm<PermitValues>({
    defaultValues: blankPermit(),
    resolver: bodyResolver(NewPermit, permitBody),
  })
  const enter = useEnterPermit()
  const may = useMay('register.manage')
  const [general, setGeneral] = useState<string>()
  const { errors, isSubmitting, isDirty } = form.formState
  // while it is being sent, what follows may lead away
  const { blocker } = useLeaveGuard(isDirty && !isSubmitting)
  const says = (name: keyof PermitValues) => errors[name]?.message
  const field = (name: keyof PermitValues) => ({ id: name, wrong: says(name), ...form.register(name) })

  const send = form.handleSubmit(async (values) => {
    setGeneral(undefined)
    try {
      onEntered(await enter.mutateAsync(NewPermit.parse(permitBody(values))))
    } catch (error) {
      if (!isProblem(error)) throw error
      setGeneral(applyProblem(form, error))
    }
  })
  return (
    <>
      <form className="stack gap-4 form-column" noValidate onSubmit={(event) => void send(event)}>
        <WrongSummary
          fields={listFaults(errors, (name) => labels[name as keyof PermitValues]?.() ?? name)}
          general={general}
        />
        <TextField label={words.permitNumber} {...field('permitNumber')} />
        <TextField label={words.authority} {...field('authority')} />
        <SelectField
          label={words.kind}
          options={permitKinds.map((kind) => ({ value: kind, label: permitKindNames[kind] }))}
          {...field('kind')}
        />
        <div className="pair">
          <TextField label={words.validFrom} type="date" {...field('validFrom')} />
          <TextField label={words.validUntil} type="date" {...field('validUntil')} />
        </div>
        <TextField
          label={words.quantity}
          hint={words.quantityHint}
          optional
          inputMode="numeric"
          {...field('quantityAllowed')}
        />
        <Controller
          control={form.control}
          name="taxonIds"
          render={({ field: taxa }) => (
            <TaxaField value={taxa.value} wrong={says('taxonIds')} onChange={taxa.onChange} />
          )}
        />
        <Controller
          control={form.control}
          name="counterpartyId"
          render={({ field: party }) => (
            <PartyChooser label={words.party} optional wrong={says('counterpartyId')} {...party} />
          )}
        />
        <SelectField
          label={words.purpose}
          optional
          options={purposeCodes.map((code) => ({ value: code, label: purposeCodeNames[code] }))}
          {...field('purposeCode')}
        />
        <TextareaField label={words.conditions} optional {...field('conditions')} />
        <div>
          <Button
            kind="primary"
            type="submit"
            shut={may.allowed ? isSubmitting && formWords.sending : words.mayNot}
          >
            {words.save}
          </Button>
        </div>
      </form>
      <LeaveQuestion blocker={blocker} />
    </>
  )
}

/** Taxa that a permit is restricted to: chosen one after the other, each taken away by its own button. */
function TaxaField({
  value,
  wrong,
  onChange,
}: {
  value: string[]
  wrong: string | undefined
  onChange: (next: string[]) => void
}) {
  const { data } = useQuery(everyTaxon)
  const nameOf = (id: string) => data?.rows.find((row) => row.id === id)?.commonName ?? id
  return (
    <div className="stack">
      <TaxonChooser
        id="taxonIds"
        label={words.taxa}
        optional
        hint={words.taxaHint}
        wrong={wrong}
        value={null}
        onChange={(next) => {
          if (next !== null && !value.includes(next)) onChange([...value, next])
        }}
      />
      {value.length > 0 ? (
        <ul className="row row-wrap">
          {value.map((id) => (
            <li key={id} className="chosen">
              {nameOf(id)}
              <button
                type="button"
                className="ghost"
                aria-label={words.removeTaxon({ name: nameOf(id) })}
                onClick={() => onChange(value.filter((one) => one !== id))}
              >
                <Icon of={X} />
              </button>
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  )
}
