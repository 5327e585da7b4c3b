import { Plus, X } from 'lucide-react'
import { Controller, useFieldArray, useFormContext } from 'react-hook-form'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { blankPaper, PaperFields } from '../documents/index.ts'
import { useFormField } from './form-field.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** Papers that are attached when the transaction is recorded. */
export function PapersFields() {
  const { control } = useFormContext<TransactionValues>()
  const { wrong } = useFormField()
  const { fields, append, remove } = useFieldArray({ control, name: 'papers', keyName: 'key' })
  return (
    <section className="stack gap-4">
      <h2 className="t-head">{words.papers}</h2>
      <p className="hint">{words.papersHint}</p>
      {fields.map((paper, index) => (
        <fieldset key={paper.key} className="inset stack gap-3">
          <legend className="visually-hidden">{words.papers}</legend>
          <Controller
            control={control}
            name={`papers.${index}`}
            render={({ field }) => (
              <PaperFields
                paper={field.value}
                onChange={field.onChange}
                faults={{
                  title: wrong(`papers.${String(index)}.title`),
                  kind: wrong(`papers.${String(index)}.kind`),
                  file: wrong(`papers.${String(index)}.file`),
                }}
              />
            )}
          />
          <div>
            <Button kind="plain" size="small" icon={X} onClick={() => remove(index)}>
              {words.removePaper({ n: index + 1 })}
            </Button>
          </div>
        </fieldset>
      ))}
      <div>
        <Button icon={Plus} onClick={() => append(blankPaper())}>
          {words.addPaper}
        </Button>
      </div>
    </section>
  )
}
