import { useState } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import { parameterOf, readingParameters } from '../../../shared/domain/readings/parameters.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { saidNote, useCarried } from '../../lib/bench-carry.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { CarriedReading } from './carried-water.tsx'
import { useRecordReadings } from './mutations.ts'
import { parametersOf } from './parameter-order.ts'
import {
  emptyField,
  entryUnitsOf,
  judgeField,
  pointerOf,
  readingsBody,
  withComputed,
} from './reading-form-model.ts'
import type { ReadingField } from './reading-form-model.ts'
import { rangeText, readingText } from './reading-text.ts'
import { parameterHeading } from './parameter-heading.ts'

const usual: readonly ReadingParameter[] = ['temperature', 'dissolved-oxygen', 'ph']
/** Readings entered at the tank: one field a parameter, with what is wanted and what it was last time beside it. */
export function ReadingForm({ water }: { water: WaterOfEnclosure }) {
  const { code, waterBodyId } = water.enclosure
  const when = useMoment()
  const say = useToast()
  const navigate = useNavigate()
  const record = useRecordReadings()
  const refusal = useRefusal()
  const [bodyId, setBodyId] = useState(waterBodyId ?? '')
  const [instrument, setInstrument] = useState('')
  const carried = useCarried('reading')
  const [start] = useState<ReadingField[]>(() => {
    const known = parametersOf(water.ranges, water.latest)
    const shown = known.length > 0 ? known : usual
    if (!carried) return shown.map((parameter) => fieldFor(parameter))
    const { parameter, value, said } = carried
    const others = shown.filter((one) => one !== parameter).map((one) => fieldFor(one))
    return [withComputed(fieldFor(parameter), value as Quantity, saidNote(said)), ...others]
  })
  const [fields, setFields] = useState(start)

  function fieldFor(parameter: ReadingParameter): ReadingField {
    return emptyField(
      newId(),
      parameter,
      water.latest.find((row) => row.parameter === parameter),
    )
  }
  const change = (field: ReadingField, next: Partial<ReadingField>) =>
    setFields(fields.map((one) => (one === field ? { ...one, ...next } : one)))
  const filled = fields.filter((field) => field.value.trim() !== '')
  // what the bench filled in is still there when one goes back to it
  const typed = filled.filter(({ id, value }) => start.find((one) => one.id === id)?.value !== value)
  const { blocker, letGo } = useLeaveGuard(typed.length > 0)
  const others = readingParameters.filter(
    (parameter) => !fields.some((field) => field.parameter === parameter),
  )
  const shownPointers = fields.flatMap((field) =>
    ['value', 'scale', 'below'].map((part) => pointerOf(fields, field, part)),
  )

  const send = async () => {
    if (when.instant === null || filled.length === 0) return
    const body = readingsBody(fields, { waterBodyId: bodyId, happenedAt: when.instant, instrument })
    const done = await refusal.attempt(() => record.mutateAsync(body))
    if (!done) return
    say({ words: readingWords.saved({ count: body.readings.length, code }) })
    letGo()
    void navigate(paths.enclosure(code))
  }

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={
            <>
              <Link to={paths.water()}>{waterWords.title}</Link>
              {' / '}
              <Link to={paths.enclosure(code)}>{code}</Link>
            </>
          }
          title={readingWords.formTitle}
          source={readingWords.formSource}
        />
      </Area>
      <Area className="pane">
        <form
          className="tank-form tank-form-wide"
          noValidate
          onSubmit={(event) => {
            event.preventDefault()
            void send()
          }}
        >
          <WrongSummary fields={[]} general={refusal.general([...shownPointers, '/happenedAt'])} />
          {carried ? <CarriedReading carried={carried} isIn={fields.some((one) => one.computed)} /> : null}
          <div className="reading-fields">
            {water.bodies.length > 1 ? (
              <SelectField
                label={readingWords.where}
                startsEmpty={false}
                options={water.bodies.map((body) => ({ value: body.id, label: `${body.code} ${body.name}` }))}
                value={bodyId}
                onChange={(event) => setBodyId(event.target.value)}
              />
            ) : null}
            <MomentField
              label={waterWords.when}
              hint={when.inWords}
              value={when.moment}
              onChange={when.setMoment}
              wrong={when.missing ?? refusal.at('/happenedAt')}
            />
            <TextField
              label={readingWords.instrument}
              optional
              maxLength={120}
              value={instrument}
              onChange={(event) => setInstrument(event.target.value)}
            />
          </div>
          <div className="reading-fields">
            {fields.map((field) => (
              <OneReading
                key={field.id}
                field={field}
                water={water}
                zone={when.zone}
                refused={['value', 'scale', 'below']
                  .map((part) => refusal.at(pointerOf(fields, field, part)))
                  .find(Boolean)}
                onChange={(next) => change(field, next)}
              />
            ))}
          </div>
          {others.length > 0 ? (
            <div className="max-w-[260px]">
              <SelectField
                label={readingWords.anotherParameter}
                options={others.map((parameter) => ({
                  value: parameter,
                  label: parameterHeading(parameter),
                }))}
                value=""
                onChange={(event) => setFields([...fields, fieldFor(event.target.value as ReadingParameter)])}
              />
            </div>
          ) : null}
          <div className="form-foot">
            <Button
              kind="primary"
              size="touch"
              type="submit"
              disabled={refusal.busy}
              shut={filled.length === 0 ? readingWords.typeOne : when.missing}
            >
              {readingWords.save({ count: filled.length })}
            </Button>
            <ButtonLink size="touch" to={paths.enclosure(code)}>
              {waterWords.back}
            </ButtonLink>
          </div>
        </form>
      </Area>
      <LeaveQuestion blocker={blocker} />
    </Sheet>
  )
}

/** One parameter: number with its unit, what is wanted, what it was, and at once how the new figure stands to it. */
function OneReading({
  field,
  water,
  zone,
  refused,
  onChange,
}: {
  field: ReadingField
  water: WaterOfEnclosure
  zone: string
  refused: string | undefined
  onChange: (next: Partial<ReadingField>) => void
}) {
  const [left, setLeft] = useState(false)
  const range = water.ranges.find((one) => one.parameter === field.parameter)
  const latest = water.latest.find((one) => one.parameter === field.parameter)
  const says = judgeField(field, range)
  const hint = [
    range ? rangeText(range) : '',
    latest
      ? readingWords.lastHint({
          value: readingText(latest).text,
          at: sayMoment(latest.happenedAt, zone, water.asOf),
        })
      : '',
  ]
    .filter(Boolean)
    .join('; ')
  const { judged } = says
  return (
    <div className="stack gap-1">
      <QuantityField
        label={parameterHeading(field.parameter)}
        units={entryUnitsOf(field.parameter)}
        allowNegative={parameterOf(field.parameter).least < 0}
        quantity={{ value: field.value, unit: field.unit }}
        onChange={({ value, unit }) => onChange({ value, unit })}
        onBlur={() => setLeft(true)}
        hint={
          judged ? (
            <span className={judged.outside ? 'text-magenta font-semibold' : undefined}>{judged.words}</span>
          ) : (
            hint
          )
        }
        wrong={refused ?? (left ? says.wrong : undefined)}
      />
      {parameterOf(field.parameter).mayBeBelow && field.value.trim() !== '' ? (
        <Tick
          label={readingWords.belowMark}
          checked={field.below}
          onChange={(event) => onChange({ below: event.target.checked })}
        />
      ) : null}
    </div>
  )
}
