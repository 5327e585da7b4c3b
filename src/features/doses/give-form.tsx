import { useState } from 'react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { recordWords, sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useGiveDose } from './mutations.ts'
import { amountUnits } from './sheet-model.ts'

/** Giving: the amount that the balance shows, typed by the person, never filled in for them. */
export function GiveForm({ sheet, lotId }: { sheet: BathSheet; lotId: string }) {
  const { number, key } = sheet
  const units = amountUnits(sheet)
  const [amount, setAmount] = useState({ value: '', unit: units[0] ?? 'g' })
  const [note, setNote] = useState('')
  const [id] = useState(newId)
  const give = useGiveDose({ number, key })
  const refusal = useRefusal()
  const say = useToast()
  const send = async () => {
    const typed = typedText(note)
    const body = { id, lotId, amount, ...(typed === undefined ? {} : { note: typed }) }
    if (await refusal.attempt(() => give.mutateAsync(body))) say({ words: words.given })
  }
  return (
    <form
      className="stack gap-4 sheet-give"
      noValidate
      onSubmit={(event) => {
        event.preventDefault()
        void send()
      }}
    >
      <h2 className="t-head">{words.give}</h2>
      <WrongSummary fields={[]} general={refusal.general(['/amount'])} />
      <QuantityField
        label={words.weighed}
        hint={words.weighedHint({ amount: sheet.amountNowText ?? '' })}
        units={units.map((unit) => ({ unit, label: isUnitCode(unit) ? unitOf(unit).symbol : unit }))}
        quantity={amount}
        onChange={setAmount}
        wrong={refusal.at('/amount')}
      />
      <TextareaField
        label={words.giveNote}
        optional
        rows={2}
        maxLength={1000}
        value={note}
        onChange={(event) => setNote(event.target.value)}
      />
      <Button
        kind="primary"
        size="touch"
        type="submit"
        block
        disabled={refusal.busy}
        shut={lotId === '' ? words.chooseLot : amount.value.trim() === '' ? recordWords.typeAmount : false}
      >
        {sheet.contactMinutes === null ? words.giveActLeft : words.giveAct}
      </Button>
    </form>
  )
}
