import { Controller, useFormContext, useWatch } from 'react-hook-form'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { TextField } from '../../ui/text-field.tsx'
import { AnimalChooser } from '../animals/index.ts'
import { useFormField } from './form-field.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** One animal or group that leaves, whole or in part. */
export function LineOutFields({ index }: { index: number }) {
  const { control, setValue } = useFormContext<TransactionValues>()
  const { wrong, field } = useFormField()
  const at = `lines.${index}` as const
  const chosenForm = useWatch({ control, name: `${at}.chosenForm` })
  return (
    <div className="stack gap-3">
      <Controller
        control={control}
        name={`${at}.animalId`}
        render={({ field: animal }) => (
          <AnimalChooser
            {...animal}
            id={`${at}.animalId`}
            label={words.animal}
            wrong={wrong(`${at}.animalId`)}
            onForm={({ form }) => setValue(`${at}.chosenForm`, form)}
          />
        )}
      />
      {chosenForm === 'individual' ? null : (
        <TextField label={words.countOut} inputMode="numeric" {...field(`${at}.count`)} />
      )}
    </div>
  )
}
