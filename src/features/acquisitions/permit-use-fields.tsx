import { Plus, X } from 'lucide-react'
import { Controller, useFieldArray, useFormContext, useWatch } from 'react-hook-form'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { PermitChooser } from '../permits/index.ts'
import { useFormField } from './form-field.ts'
import { blankPermitUse } from './transaction-form-model.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** Which permit covers how many of which animals. */
export function PermitUseFields() {
  const { control } = useFormContext<TransactionValues>()
  const { field, wrong } = useFormField()
  const { fields, append, remove } = useFieldArray({ control, name: 'permitUses', keyName: 'key' })
  const lines = useWatch({ control, name: 'lines' })
  return (
    <section className="stack gap-4">
      <h2 className="t-head">{words.permits}</h2>
      {fields.length === 0 ? <p className="hint">{words.noPermits}</p> : null}
      {fields.map((use, index) => {
        const at = `permitUses.${index}` as const
        return (
          <fieldset key={use.key} className="inset stack gap-3">
            <legend className="visually-hidden">{words.permit}</legend>
            <Controller
              control={control}
              name={`${at}.permitId`}
              render={({ field: permit }) => (
                <PermitChooser
                  {...permit}
                  id={`${at}.permitId`}
                  label={words.permit}
                  wrong={wrong(`${at}.permitId`)}
                />
              )}
            />
            <div className="pair">
              {lines.length > 1 ? (
                <SelectField
                  label={words.permitLine}
                  options={lines.map((line, n) => ({ value: line.id, label: words.line({ n: n + 1 }) }))}
                  {...field(`${at}.lineId`)}
                />
              ) : null}
              <TextField label={words.permitQuantity} inputMode="numeric" {...field(`${at}.quantity`)} />
            </div>
            <div>
              <Button kind="plain" size="small" icon={X} onClick={() => remove(index)}>
                {words.removePermit({ n: index + 1 })}
              </Button>
            </div>
          </fieldset>
        )
      })}
      <div>
        <Button
          icon={Plus}
          onClick={() => append(blankPermitUse(lines.length === 1 ? (lines[0]?.id ?? '') : ''))}
        >
          {words.addPermit}
        </Button>
      </div>
    </section>
  )
}
