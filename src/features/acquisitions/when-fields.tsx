import { Controller, useFormContext, useWatch } from 'react-hook-form'
import { acquisitionKinds, dispositionKinds } from '../../../shared/domain/register/transaction-kinds.ts'
import { transactionKindNames } from '../../../shared/messages/register-kinds.ts'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useFormField } from './form-field.ts'
import { rulesOf } from './transaction-form-model.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** How and when: the kind, whether it has happened, the date as exactly as it is known. */
export function WhenFields({ way }: { way: 'in' | 'out' }) {
  const { control } = useFormContext<TransactionValues>()
  const { field, wrong } = useFormField()
  const kind = useWatch({ control, name: 'kind' })
  const rules = rulesOf(kind)
  const kinds = way === 'in' ? acquisitionKinds : dispositionKinds
  return (
    <>
      <SelectField
        label={way === 'in' ? words.how : words.howOut}
        options={kinds.map((value) => ({ value, label: transactionKindNames[value] }))}
        {...field('kind')}
      />
      {rules?.befalls ? (
        <p className="hint">{words.befalls}</p>
      ) : (
        <Controller
          control={control}
          name="stage"
          render={({ field: stage }) => (
            <ChoiceField
              label={words.stage}
              hint={words.stageHint}
              wrong={wrong('stage')}
              segments={[
                { value: 'now', label: words.stageNow },
                { value: 'already', label: words.stageAlready },
              ]}
              value={stage.value}
              onChange={stage.onChange}
            />
          )}
        />
      )}
      <div className="pair">
        <TextField label={words.on} hint={words.onHint} autoComplete="off" {...field('on')} />
        <TextField label={words.time} hint={words.timeHint} optional type="time" {...field('time')} />
      </div>
    </>
  )
}
