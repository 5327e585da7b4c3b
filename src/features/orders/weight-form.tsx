import { useMemo, useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import type { WeightOrderPreview } from '../../../shared/contracts/weight-orders.contract.ts'
import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { orderFormWords } from '../../../shared/messages/order-form.ts'
import { orderListWords, orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { weightFormWords as words } from '../../../shared/messages/weight-form.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useSettled } from '../../lib/use-settled.ts'
import { Cartouche } from '../../ui/cartouche.tsx'
import { CautionGroupBlock } from '../../ui/caution-block.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { cautionKey } from './answers-model.ts'
import { DoseText } from './dose-text.tsx'
import { cautionCount } from './judged-cautions.tsx'
import { doseOfEntered, OrderConditions, OrderWorking } from './order-parts.tsx'
import { weightPreviewQuery } from './queries.ts'
import { CautionSource } from './signed-cautions.tsx'
import { WeightFields } from './weight-fields.tsx'
import { emptyWeightValues, weightFieldsOf } from './weight-form-model.ts'

const pauseMs = 400

/**
 * A dose by the weight of an animal: whom and what at the left, the amount with its working in the middle, what speaks
 * against it at the right. The server works it out and judges it after every pause; nothing is kept.
 */
export function WeightForm({ animalId }: { animalId: string | null }) {
  const [values, setValues] = useState(() => emptyWeightValues(animalId))
  const fields = useMemo(() => weightFieldsOf(values), [values])
  const text = JSON.stringify(fields)
  const settled = useSettled(text, pauseMs)
  const preview = useQuery(
    weightPreviewQuery(settled === 'null' ? null : (JSON.parse(settled) as typeof fields)),
  )
  const judged = fields === null || preview.isError ? undefined : preview.data
  const current = settled === text && !preview.isFetching
  const refusal = judged?.refusal
  const wrong = (name: string) => {
    if (isProblem(preview.error))
      return preview.error.errors.find(({ pointer }) => pointer === `/${name}`)?.detail
    const isTyped = name === 'target' || name === 'division' || name === 'mostPerPlace'
    const typed = isTyped && values[name].value.trim() !== ''
    return typed && refusal?.field === name ? refusal.detail : undefined
  }
  return (
    <Sheet recipe="order">
      <Area>
        <Cartouche
          place={<Link to={paths.orders()}>{orderListWords.title}</Link>}
          title={words.title}
          source={words.source}
        />
        <div className="pane stack gap-4">
          <p className="t-strong">{words.noOrder}</p>
          <WeightFields
            values={values}
            wrong={wrong}
            onChange={(changes) => setValues((old) => ({ ...old, ...changes }))}
          />
        </div>
      </Area>
      <Area className="area-order-middle">
        <Head
          preview={judged}
          current={current}
          error={preview.isError ? preview.error : null}
          asked={fields !== null}
        />
        {judged && judged.working.length > 0 ? (
          <div className="pane stack gap-5">
            <section className="stack">
              <h2 className="t-head">{orderViewWords.working}</h2>
              <OrderWorking lines={judged.working} />
              {judged.amount ? <Notes amount={judged.amount} /> : null}
            </section>
          </div>
        ) : null}
      </Area>
      <Area ground="land" className="area-order-side">
        {judged && (judged.amount !== null || judged.cautions.length > 0) ? (
          <div className="pane stack gap-5">
            <OrderConditions conditions={judged.conditions} />
            <Cautions cautions={judged.cautions} />
          </div>
        ) : (
          <p className="pane">{orderFormWords.notYetJudged}</p>
        )}
      </Area>
    </Sheet>
  )
}

function Head({
  preview,
  current,
  error,
  asked,
}: {
  preview: WeightOrderPreview | undefined
  /** What is shown belongs to what is typed. */
  current: boolean
  error: Error | null
  asked: boolean
}) {
  const { amount, refusal, weight, animal } = preview ?? {}
  const why = error
    ? isProblem(error)
      ? error.says
      : orderFormWords.notJudged
    : (refusal?.detail ?? (asked ? words.chooseRest : words.chooseAnimal))
  return (
    <div className="dose-head">
      <div aria-live="polite" aria-busy={!current && preview !== undefined}>
        <p>{amount ? words.each : words.notNow}</p>
        {amount ? (
          <p>
            <DoseText text={amount.text} size="dose" />
          </p>
        ) : (
          <p className="dose-drug">{why}</p>
        )}
        {preview && !current ? <p>{orderFormWords.old}</p> : null}
      </div>
      {animal ? (
        <div>
          <p>{words.weight}</p>
          {weight ? (
            <>
              <p>
                <DoseText text={weight.text} kind="reading" size="mid" />
              </p>
              <p>{sayWeighed(weight)}</p>
            </>
          ) : (
            <p>{words.noWeight}</p>
          )}
          <p>
            <Link to={paths.animal(animal.accession)}>
              {orderFormWords.animal({ accession: animal.accession, name: animal.commonName })}
            </Link>
            , {orderFormWords.animalHint({ count: animal.countText, code: animal.enclosureCode })}
          </p>
        </div>
      ) : null}
    </div>
  )
}

function sayWeighed(weight: NonNullable<WeightOrderPreview['weight']>): string {
  const said = { date: sayDate(weight.happenedOn), basis: words[weight.basis] }
  return weight.animalsWeighed === 1
    ? words.weighed(said)
    : words.weighedTogether({ ...said, count: weight.animalsWeighed })
}

/** What the rounding makes of the dose, what goes in where, and whether it can be read on the step. */
function Notes({ amount }: { amount: NonNullable<WeightOrderPreview['amount']> }) {
  const { roundingPercent, portions, thinTo } = amount
  const percent = roundingPercent === null ? null : Number(roundingPercent.toPrecision(2))
  return (
    <>
      {percent === null ? null : (
        <p className="t-note">
          {percent === 0
            ? words.exact
            : words.rounding({
                percent: formatReading(quantityOf(Math.abs(percent), 'percent')).text,
                larger: percent > 0,
              })}
        </p>
      )}
      {thinTo === null ? null : <p className="t-note">{words.thin({ times: thinTo })}</p>}
      {portions.length > 0 ? (
        <section>
          <h3 className="t-label">{words.portions}</h3>
          <ol className="list">
            {portions.map((portion, at) => (
              <li key={at}>
                {words.portion({ n: at + 1 })}: <DoseText text={doseOfEntered(portion)} size="strong" />
              </li>
            ))}
          </ol>
        </section>
      ) : null}
    </>
  )
}

/** Cautions as they stand now; there is nothing to answer, since nothing is signed here. */
function Cautions({ cautions }: { cautions: readonly SaidCaution[] }) {
  return (
    <section className="stack">
      <h2 className="t-head">{orderViewWords.cautions}</h2>
      <p className="t-2" role="status">
        {cautionCount(cautions)}
      </p>
      {groupSaid(cautions).map(({ lead, members }) => (
        <CautionGroupBlock
          key={cautionKey(lead)}
          members={members.map((caution) => ({
            key: cautionKey(caution),
            ruleId: caution.ruleId,
            level: caution.level,
            title: caution.title,
            source: <CautionSource caution={caution} />,
            children: `${caution.text}${caution.secondCalculation ? ` ${orderViewWords.secondPerson}` : ''}`,
          }))}
        />
      ))}
    </section>
  )
}
