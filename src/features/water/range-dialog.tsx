import { useState } from 'react'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { rangeLimits } from '../../../shared/domain/readings/water-range.ts'
import type { RangeLimit } from '../../../shared/domain/readings/water-range.ts'
import type { Range } from '../../../shared/contracts/water-facts.ts'
import { parameterNames } from '../../../shared/messages/water.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useSetRange } from './mutations.ts'
import { unitOptionsOf } from './reading-form-model.ts'

/** What is wanted of one parameter in an enclosure: two inner limits and two outer ones, each of which may be missing. */
export function RangeDialog({
  code,
  parameter,
  range,
  onBack,
}: {
  code: string
  parameter: ReadingParameter
  range: Range | undefined
  onBack: () => void
}) {
  const set = useSetRange(code)
  const refusal = useRefusal()
  const units = unitOptionsOf(parameter)
  const [id] = useState(newId)
  const [unit, setUnit] = useState(range?.unit ?? units[0]?.unit ?? '')
  const [limits, setLimits] = useState<Record<RangeLimit, string>>({
    outerLow: range?.entered.outerLow ?? '',
    innerLow: range?.entered.innerLow ?? '',
    innerHigh: range?.entered.innerHigh ?? '',
    outerHigh: range?.entered.outerHigh ?? '',
  })
  const [touched, setTouched] = useState(false)
  const label = units.find((option) => option.unit === unit)?.label ?? unit

  const save = async () => {
    if (await refusal.attempt(() => set.mutateAsync({ id, parameter, unit, ...limits }))) onBack()
  }

  return (
    <Dialog
      question={readingWords.rangeQuestion({ parameter: parameterNames[parameter] })}
      onBack={onBack}
      typed={touched}
      acts={
        <>
          <Button kind="primary" disabled={refusal.busy} onClick={() => void save()}>
            {readingWords.saveRange}
          </Button>
          <Button onClick={onBack}>{waterWords.back}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refusal.general(rangeLimits.map((limit) => `/${limit}`))} />
        <p className="t-2">{readingWords.rangeHint}</p>
        {units.length > 1 ? (
          <SelectField
            label={readingWords.unit}
            startsEmpty={false}
            options={units.map((option) => ({ value: option.unit, label: option.label ?? option.unit }))}
            value={unit}
            onChange={(event) => setUnit(event.target.value)}
          />
        ) : null}
        <div className="measure-fields">
          {rangeLimits.map((limit) => (
            <QuantityField
              key={limit}
              label={readingWords[limit]}
              optional
              allowNegative
              units={[{ unit, label }]}
              quantity={{ value: limits[limit], unit }}
              onChange={({ value }) => {
                setTouched(true)
                setLimits({ ...limits, [limit]: value })
              }}
              wrong={refusal.at(`/${limit}`)}
            />
          ))}
        </div>
      </div>
    </Dialog>
  )
}
