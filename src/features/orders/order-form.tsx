import { useMemo, useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link, useLocation, useNavigate } from 'react-router-dom'
import { Save } from 'lucide-react'
import type { BathOrderFields, BenchAsked, SaidBench } from '../../../shared/contracts/order-primitives.ts'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { scheduleOf } from '../../../shared/domain/licences/controlled-agents.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { orderListWords, orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { relationshipWords } from '../../../shared/messages/orders.ts'
import { carryState, useCarried } from '../../lib/bench-carry.ts'
import type { CarryTo } from '../../lib/bench-carry.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { useSettled } from '../../lib/use-settled.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { formularyQuery } from '../formulary/index.ts'
import { useSigner } from '../licences/index.ts'
import { answersToSend, noAnswers, whyNotSign } from './answers-model.ts'
import type { Answers } from './answers-model.ts'
import { CarriedIntoOrder } from './carried-order.tsx'
import { copiedOrder, fieldsOfOrder } from './copied-order.ts'
import { CourseFields } from './course-fields.tsx'
import { JudgedCautions } from './judged-cautions.tsx'
import { OrderFields } from './order-fields.tsx'
import { OrderFormFoot } from './order-form-foot.tsx'
import { carriedOrder, emptyOrder, fieldsOf, valuesOf } from './order-form-model.ts'
import type { OrderValues } from './order-form-model.ts'
import { faultLabel } from './fault-label.ts'
import { AmountNotes, OrderConditions, OrderWater, OrderWorking } from './order-parts.tsx'
import { PreviewHead } from './preview-head.tsx'
import { previewQuery } from './queries.ts'
import { SignBlock } from './sign-block.tsx'
import { StaleChoice } from './stale-choice.tsx'
import { StatedFields } from './stated-fields.tsx'
import { useOrderWriting } from './use-order-writing.ts'

const pauseMs = 400
const relationship = {
  heading: relationshipWords.heading,
  text: relationshipWords.statement,
  needed: relationshipWords.needed,
}

/**
 * Writing a treatment order: what is ordered at the left, the amount with its working in the middle, conditions,
 * cautions and the signature at the right. The server works it out and judges it after every pause.
 */
export function OrderForm({
  opened,
  copied = null,
  above,
}: {
  opened: Order | null
  /** An earlier order that a new one begins as. */
  copied?: Order | null
  above?: React.ReactNode
}) {
  const me = useMe()
  const { zone } = me.facility
  const navigate = useNavigate()
  const location = useLocation()
  const say = useToast()
  const sign = useMay('order.sign')
  const draft = useMay('order.draft')
  const isProposal = draft.conditions.includes('proposal-only')
  const carried = useCarried('order')
  const [start] = useState(() => startOf({ opened, copied, zone, carried }))
  const [values, setValues] = useState<OrderValues>(start)
  const [answers, setAnswers] = useState<Answers>(
    () => (location.state as { answers?: Answers } | null)?.answers ?? noAnswers,
  )
  const [tried, setTried] = useState(false)
  const { data: formulary } = useQuery(formularyQuery)
  const product = formulary?.products.find((one) => one.id === values.productId)
  const signer = useSigner(product ? scheduleOf(product.agent) : null)
  const { fields, faults } = useMemo(() => fieldsOf(values, zone), [values, zone])
  const writing = useOrderWriting(opened, useState(() => fieldsOf(start, zone).fields)[0])
  const text = JSON.stringify(fields)
  const unsaved =
    writing.kept === null
      ? JSON.stringify(values) !== JSON.stringify(start)
      : writing.kept.text !== text || faults.length > 0
  const { blocker, letGo } = useLeaveGuard(unsaved)
  const settled = useSettled(text, pauseMs)
  const preview = useQuery(
    previewQuery(settled === 'null' ? null : (JSON.parse(settled) as typeof fields), writing.kept?.number),
  )
  const judged = fields === null ? undefined : preview.data
  const current = settled === text && !preview.isFetching && !preview.isError
  // without a product there is nothing to judge, which is not the same as no caution
  const isJudged = judged !== undefined && (judged.amount !== null || judged.refusal !== null)
  const change = (changes: Partial<OrderValues>) => setValues((old) => ({ ...old, ...changes }))
  const wrong = (name: keyof OrderValues) =>
    faults.find((fault) => fault.name === name)?.says ??
    (tried && name === 'enclosureId' && fields === null ? words.chooseEnclosure : undefined)
  const shown = { values, onChange: change, wrong }
  const { problem, theirs } = writing
  const passwordWrong = isProblem(problem, 'password-wrong') ? problem.says : undefined
  const stale = isProblem(problem, 'stale-version') && theirs !== null

  const keep = async () => {
    setTried(true)
    if (!fields || faults.length > 0) {
      document.getElementById(faults[0]?.name ?? 'enclosureId')?.focus()
      return
    }
    const order = await writing.keep(fields)
    if (!order) return
    say({ words: words.kept({ number: order.number }) })
    // the address of a kept draft is its own; what was answered to the cautions goes with it
    if (location.pathname !== paths.editOrder(order.number)) {
      letGo()
      void navigate(paths.editOrder(order.number), {
        replace: true,
        state: { answers, ...(carried ? carryState(carried) : {}) },
      })
    }
  }
  const signNow = async (password: string, stated: boolean) => {
    setTried(true)
    if (!fields || !judged) return false
    const order = await writing.signNow(fields, {
      password,
      licenceId: signer.licenceId,
      ...(stated ? { relationship: true } : {}),
      ...answersToSend(judged.cautions, answers),
    })
    if (!order) {
      signer.readAgain()
      return false
    }
    letGo()
    say({ words: words.signed({ number: order.number }) })
    void navigate(paths.order(order.number))
    return true
  }

  const number = writing.kept?.number
  const amending = opened?.versionNo ?? null
  return (
    <Sheet recipe="order">
      <Area>
        <Cartouche
          place={
            <>
              <Link to={paths.orders()}>{orderListWords.title}</Link>
              {' / '}
              {opened ? (
                <Link to={paths.order(opened.number)}>{opened.number}</Link>
              ) : (
                (number ?? words.newTitle)
              )}
            </>
          }
          title={orderViewWords.kind}
          source={
            amending !== null
              ? words.amendSource({ n: amending })
              : opened
                ? words.editSource
                : words.newSource
          }
        />
        <div className="pane stack gap-4">
          {above}
          <CarriedIntoOrder
            bench={values.bench}
            carried={carried}
            said={judged?.bench ?? null}
            withheld={opened?.benchWithheld ?? false}
            onChange={(bench) => change({ bench })}
          />
          {copied && !opened ? <p className="hint">{words.copied({ number: copied.number })}</p> : null}
          {isProposal ? <p className="hint">{words.proposalNote}</p> : null}
          {stale && fields ? (
            <StaleChoice
              theirs={theirs.draft}
              mine={fields}
              known={{
                zone,
                bench: (asked) =>
                  sayBench(asked, [theirs.draftBench, judged?.bench ?? null], [theirs.draft, fields]),
                products: formulary?.products ?? [],
                animals: new Map(judged?.water.animals.map((animal) => [animal.animalId, animal.accession])),
              }}
              busy={writing.busy !== null}
              onMine={() => {
                void writing.keepOver(fields).then((order) => {
                  if (order) say({ words: words.kept({ number: order.number }) })
                })
              }}
              onTheirs={() => {
                if (!theirs.draft) return
                const taken = valuesOf(theirs.draft, zone)
                const takenFields = fieldsOf(taken, zone).fields
                setValues(taken)
                if (takenFields) writing.takeTheirs(takenFields)
              }}
            />
          ) : null}
          <OrderFields {...shown} water={judged?.water} />
          <CourseFields {...shown} zone={zone} />
          <StatedFields
            values={values}
            onChange={change}
            water={judged?.water}
            agent={formulary?.products.find(({ id }) => id === values.productId)?.agent}
          />
          <WrongSummary
            fields={
              tried
                ? faults.map((fault) => ({
                    id: fault.name,
                    label: faultLabel(fault.name),
                    says: fault.says,
                  }))
                : []
            }
            general={writing.refusedAt === 'keep' && !stale ? problem?.says : undefined}
          />
          <div className="row row-wrap">
            <Button icon={Save} disabled={writing.busy !== null} onClick={() => void keep()}>
              {isProposal ? words.keepProposal : words.keepDraft}
            </Button>
            {opened ? <ButtonLink to={paths.order(opened.number)}>{words.goBack}</ButtonLink> : null}
          </div>
        </div>
      </Area>
      <Area className="area-order-middle">
        <PreviewHead preview={judged} current={current} error={preview.isError ? preview.error : null} />
        {judged ? (
          <div className="pane stack gap-5">
            {judged.working.length > 0 ? (
              <section className="stack">
                <h2 className="t-head">{orderViewWords.working}</h2>
                <OrderWorking lines={judged.working} />
                {judged.amount ? (
                  <AmountNotes amount={judged.amount} division={fields?.division ?? null} />
                ) : null}
              </section>
            ) : null}
            <OrderWater water={judged.water} heading={words.waterHeading} />
          </div>
        ) : null}
      </Area>
      <Area ground="land" className="area-order-side">
        {judged && isJudged ? (
          <div className="pane stack gap-5">
            <OrderConditions conditions={judged.conditions} />
            <JudgedCautions
              cautions={judged.cautions}
              answers={answers}
              onAnswers={setAnswers}
              maySign={sign.allowed}
            />
          </div>
        ) : (
          <p className="pane">{words.notYetJudged}</p>
        )}
        <div className="pane">
          <SignBlock
            signer={signer}
            shut={whyNotSign({ preview: judged, current, answers, faults: faults.length })}
            missing={judged?.missing ?? []}
            busy={writing.busy === 'sign'}
            passwordWrong={passwordWrong}
            refused={writing.refusedAt === 'sign' && passwordWrong === undefined ? problem?.says : undefined}
            statement={fields?.use === 'extralabel' ? relationship : null}
            onSign={signNow}
          />
        </div>
      </Area>
      <OrderFormFoot preview={judged} mayScrollTo="sign" proposal={isProposal} />
      <LeaveQuestion blocker={blocker} />
    </Sheet>
  )
}

/** The form of a draft, of a signed order to be amended, of a copy, with what came from the bench, or empty. */
function startOf({
  opened,
  copied,
  zone,
  carried,
}: {
  opened: Order | null
  copied: Order | null
  zone: string
  carried: CarryTo<'order'> | null
}): OrderValues {
  const fields = opened && fieldsOfOrder(opened)
  if (fields) return valuesOf(fields, zone)
  const earlier = copied && fieldsOfOrder(copied)
  if (earlier) return copiedOrder(earlier, zone)
  return carried ? carriedOrder(carried) : emptyOrder()
}

/** A question to the bench, as the server said the one of them that it is. */
function sayBench(
  asked: BenchAsked,
  said: readonly (SaidBench | null)[],
  of: readonly (BathOrderFields | null)[],
): string {
  const at = of.findIndex((fields) => JSON.stringify(fields?.bench) === JSON.stringify(asked))
  const found = said[at]
  return found ? `${found.head}. ${found.inputs.join('; ')}` : asked.calculator
}
