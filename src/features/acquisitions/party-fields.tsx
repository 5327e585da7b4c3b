import { Controller, useFormContext, useWatch } from 'react-hook-form'
import { counterpartyKinds } from '../../../shared/domain/register/counterparty-kinds.ts'
import { counterpartyKindNames } from '../../../shared/messages/register-kinds.ts'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { newId } from '../../lib/new-id.ts'
import { Button } from '../../ui/button.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { PartyChooser } from '../counterparties/index.ts'
import { useFormField } from './form-field.ts'
import { rulesOf } from './transaction-form-model.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** The other party: one on file, or a new one entered together with the animals. */
export function PartyFields() {
  const { control, setValue } = useFormContext<TransactionValues>()
  const { field, wrong } = useFormField()
  const [kind, newParty] = useWatch({ control, name: ['kind', 'newCounterparty'] })
  const rules = rulesOf(kind)
  if (rules?.party === 'none') return null
  return (
    <>
      {newParty === null ? (
        <>
          <Controller
            control={control}
            name="counterpartyId"
            render={({ field: party }) => (
              <PartyChooser
                {...party}
                id="counterpartyId"
                label={words.party}
                optional={rules?.party === 'possible'}
                wrong={wrong('counterpartyId')}
              />
            )}
          />
          <div>
            <Button
              kind="plain"
              size="small"
              onClick={() =>
                setValue('newCounterparty', { id: newId(), name: '', kind: '', registration: '' })
              }
            >
              {words.newParty}
            </Button>
          </div>
        </>
      ) : (
        <fieldset className="stack gap-3 inset">
          <legend className="t-sub">{words.newParty}</legend>
          <TextField label={words.partyName} {...field('newCounterparty.name')} />
          <SelectField
            label={words.partyKind}
            options={counterpartyKinds.map((value) => ({ value, label: counterpartyKindNames[value] }))}
            {...field('newCounterparty.kind')}
          />
          <TextField label={words.registration} optional {...field('newCounterparty.registration')} />
          <div>
            <Button kind="plain" size="small" onClick={() => setValue('newCounterparty', null)}>
              {words.partyOnFile}
            </Button>
          </div>
        </fieldset>
      )}
      <TextField label={words.reference} hint={words.referenceHint} optional {...field('reference')} />
      {rules?.loan ? (
        <TextField label={words.loanDueOn} optional type="date" {...field('loanDueOn')} />
      ) : null}
    </>
  )
}
