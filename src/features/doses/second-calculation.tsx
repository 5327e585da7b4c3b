import { useState } from 'react'
import type { ReactNode } from 'react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { secondWords as words } from '../../../shared/messages/doses-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useCalculateSecond } from './mutations.ts'
import { emptySecond, hasReadAll, secondBody, secondIsOpen, strengthUnits } from './second-form-model.ts'
import { amountUnits } from './sheet-model.ts'
import { WhatGoesIn } from './sheet-parts.tsx'

type Differs = NonNullable<BathSheet['second']>['differs'][number]

const unitOptions = (units: readonly string[]) =>
  units.map((unit) => ({ unit, label: isUnitCode(unit) ? unitOf(unit).symbol : unit }))

const differsWords = (part: Differs) =>
  ({
    enclosure: words.enclosureDiffers,
    mark: words.markDiffers,
    lot: words.lotDiffers,
    strength: words.strengthDiffers,
    amount: words.amountDiffers,
  })[part]

/** The blind second calculation. Nothing of the first is here, neither drawn nor fetched. */
export function SecondCalculation({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  const what = <WhatGoesIn sheet={sheet} zone={zone} />
  const { number, key, first } = sheet
  const { secondShut } = sheet
  return (
    <>
      <p className="t-note">
        {first ? words.by({ by: first.by, at: sayMoment(first.at, zone, sheet.now) }) : null}
      </p>
      {secondShut === null ? (
        <SecondForm sheet={sheet} what={what} />
      ) : (
        <>
          <Shut sheet={sheet} why={secondShut} />
          {sheet.repeatAt === null ? null : (
            <RepeatAlone sheet={sheet} from={sayMoment(sheet.repeatAt, zone, sheet.now)} what={what} />
          )}
        </>
      )}
      <div className="stack">
        <ButtonLink kind="plain" to={`${paths.orderSheet(number)}?dose=${key}&part=whole`}>
          {words.whole}
        </ButtonLink>
        {secondShut === null ? <p className="t-note">{words.wholeNote}</p> : null}
      </div>
    </>
  )
}

const shutWords = {
  'may-not': () => [words.mayNot, words.mayNotBody],
  'no-first': () => [words.noFirst, words.noFirstBody],
  'same-person': () => [words.samePerson, words.samePersonBody],
  'amount-seen': () => [words.amountSeen, words.amountSeenBody],
  'begin-again': () => [words.beginAgain, words.beginAgainBody],
}

/** Why the second calculation cannot be made by this person now, and what has to happen. */
function Shut({ sheet, why }: { sheet: BathSheet; why: NonNullable<BathSheet['secondShut']> }) {
  const [heading, body] = shutWords[why]()
  return (
    <>
      {why === 'begin-again' ? <Differing of={sheet.second} /> : null}
      <section className="sheet-standing" role="status">
        <h2 className="t-head">{heading}</h2>
        <p>{body}</p>
      </section>
    </>
  )
}

/** Whoever made the first, with nobody else to be reached: says so, and then repeats every entry. */
function RepeatAlone({ sheet, from, what }: { sheet: BathSheet; from: string; what: ReactNode }) {
  const [isAlone, setAlone] = useState(false)
  if (isAlone) return <SecondForm sheet={sheet} what={what} isAlone />
  return (
    <div className="stack">
      <p>{words.aloneBody({ from })}</p>
      <Button size="touch" onClick={() => setAlone(true)}>
        {words.alone}
      </Button>
    </div>
  )
}

/** What did not agree, to whoever made the second calculation; nothing of the first is told. */
function Differing({ of }: { of: BathSheet['second'] }) {
  if (of === null || of.agrees) return null
  return (
    <div role="alert">
      <CautionBlock level="stop" title={words.differs}>
        {[...(of.mine ? of.differs.map(differsWords) : []), words.differsBody].join(' ')}
      </CautionBlock>
    </div>
  )
}

function SecondForm({
  sheet,
  what,
  isAlone = false,
}: {
  sheet: BathSheet
  what: ReactNode
  isAlone?: boolean
}) {
  const { number, key } = sheet
  const units = amountUnits(sheet)
  const [form, setForm] = useState(() => emptySecond(units[0] ?? 'g'))
  const [id, setId] = useState(newId)
  const calculate = useCalculateSecond({ number, key })
  const refusal = useRefusal()
  const say = useToast()
  const shut = secondIsOpen(form)
  const change = (next: Partial<typeof form>) => setForm({ ...form, ...next })

  const send = async () => {
    if (shut !== false) return
    const done = await refusal.attempt(async () => {
      const reply = await calculate.mutateAsync(secondBody(form, id, isAlone))
      setId(newId())
      // begun again from the label: nothing of the last try stays
      if (reply.second?.agrees) say({ words: words.agrees })
      else setForm(emptySecond(units[0] ?? 'g'))
    })
    if (done) window.scrollTo(0, 0)
  }

  return (
    <form
      className="stack gap-4"
      noValidate
      onSubmit={(event) => {
        event.preventDefault()
        void send()
      }}
    >
      <p>{words.intro}</p>
      {what}
      <WrongSummary
        fields={[]}
        general={refusal.general(['/amount', '/strengthRead', '/enclosureRead', '/markRead'])}
      />
      <TextField
        label={words.enclosure}
        value={form.enclosure}
        maxLength={60}
        autoComplete="off"
        wrong={refusal.at('/enclosureRead')}
        onChange={(event) => change({ enclosure: event.target.value })}
      />
      <TextField
        label={words.mark}
        hint={words.markHint}
        value={form.mark}
        maxLength={120}
        autoComplete="off"
        wrong={refusal.at('/markRead')}
        onChange={(event) => change({ mark: event.target.value })}
      />
      <QuantityField
        label={words.strength}
        units={unitOptions(strengthUnits)}
        quantity={form.strength}
        wrong={refusal.at('/strengthRead')}
        onChange={(strength) => change({ strength })}
      />
      <TextField
        label={words.lot}
        value={form.lot}
        maxLength={60}
        autoComplete="off"
        onChange={(event) => change({ lot: event.target.value })}
      />
      <QuantityField
        label={words.amount}
        hint={words.amountHint}
        units={unitOptions(units)}
        disabled={!hasReadAll(form)}
        quantity={form.amount}
        wrong={refusal.at('/amount')}
        onChange={(amount) => change({ amount })}
      />
      <Button kind="primary" size="touch" type="submit" block disabled={refusal.busy} shut={shut}>
        {words.act}
      </Button>
    </form>
  )
}
