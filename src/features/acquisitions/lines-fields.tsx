import { Plus, X } from 'lucide-react'
import { useFieldArray, useFormContext } from 'react-hook-form'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { LineInFields } from './line-in-fields.tsx'
import { LineOutFields } from './line-out-fields.tsx'
import { blankLine } from './transaction-form-model.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** The animals and groups, one block each. */
export function LinesFields({ way }: { way: 'in' | 'out' }) {
  const { control } = useFormContext<TransactionValues>()
  const { fields, append, remove } = useFieldArray({ control, name: 'lines', keyName: 'key' })
  return (
    <section className="stack gap-4">
      <h2 className="t-head">{words.lines}</h2>
      {fields.map((line, index) => (
        <fieldset key={line.key} className="inset stack gap-3">
          <legend className="t-sub">{words.line({ n: index + 1 })}</legend>
          {way === 'in' ? <LineInFields index={index} /> : <LineOutFields index={index} />}
          {fields.length > 1 ? (
            <div>
              <Button kind="plain" size="small" icon={X} onClick={() => remove(index)}>
                {words.removeLine({ n: index + 1 })}
              </Button>
            </div>
          ) : null}
        </fieldset>
      ))}
      <div>
        <Button icon={Plus} onClick={() => append(blankLine())}>
          {words.addLine}
        </Button>
      </div>
    </section>
  )
}
