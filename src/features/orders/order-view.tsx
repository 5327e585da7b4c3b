import type { ReactNode } from 'react'
import { Info, PenLine } from 'lucide-react'
import { Link } from 'react-router-dom'
import { SignedBathOrder } from '../../../shared/contracts/signed-order.ts'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { orderListWords, orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { faultWords } from '../../../shared/messages/record-fault.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Icon } from '../../ui/icon.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { AmountsNow } from './amounts-now.tsx'
import { DoseCalendar } from './dose-calendar.tsx'
import { DoseText } from './dose-text.tsx'
import { OrderActs } from './order-acts.tsx'
import { DraftFacts, SignedFacts } from './order-facts.tsx'
import { AmountNotes, OrderConditions, OrderWater, OrderWorking } from './order-parts.tsx'
import { OrderHistory, OrderVersions } from './order-history.tsx'
import { PhaseTag } from './phase-tag.tsx'
import { SignedCautions } from './signed-cautions.tsx'
import { BrokenRecord, OrderSignature } from './signature-state.tsx'
import { WithheldAmount } from './withheld-amount.tsx'

function Head({ order, more }: { order: Order; more: string }) {
  const { zone } = useMe().facility
  return (
    <Cartouche
      place={
        <>
          <Link to={paths.orders()}>{orderListWords.title}</Link>
          {' / '}
          {order.number}
          {more}
        </>
      }
      title={words.kind}
      source={
        <>
          <Link to={paths.enclosure(order.enclosureCode)}>{order.enclosureCode}</Link>, {order.enclosureName}.{' '}
          {words.source({ by: order.createdBy, at: sayInstant(order.createdAt, zone) })}
        </>
      }
      flag={<PhaseTag order={order} />}
    />
  )
}

function Notice({ children, act }: { children: ReactNode; act?: ReactNode }) {
  return (
    <div className="sheet-notice">
      <Icon of={Info} />
      <div className="stack">
        <p>{children}</p>
        {act}
      </div>
    </div>
  )
}

/** The way on to writing, for those who may. */
function GoOn({ order }: { order: Order }) {
  const may = useMay('order.draft')
  if (!may.allowed) return null
  return (
    <ButtonLink kind="primary" icon={PenLine} to={paths.editOrder(order.number)}>
      {words.goOn}
    </ButtonLink>
  )
}

/** An order that was signed and of which no version is left: what went in under it is recorded all the same. */
function GoneOrder({ order }: { order: Order }) {
  const record = useMay('dose.record')
  return (
    <>
      <BrokenRecord state="broken" fault={{ what: 'whose', entries: [] }} unreadable />
      {record.allowed ? (
        <ButtonLink to={paths.orderSheet(order.number, '1')}>{words.recordUnderGone}</ButtonLink>
      ) : null}
    </>
  )
}

/** An order that nobody signed yet, to be read. */
export function UnsignedOrder({ order, above }: { order: Order; above: ReactNode }) {
  const { zone } = useMe().facility
  return (
    <Sheet recipe="list">
      <Area>
        <Head order={order} more="" />
        <div className="pane stack">
          {above}
          {order.record === 'broken' ? (
            <GoneOrder order={order} />
          ) : (
            <>
              <p>
                {order.phase === 'proposed' ? words.proposalOf({ by: order.createdBy }) : words.notSigned}
              </p>
              {order.phase === 'proposed' ? <p>{words.notSigned}</p> : null}
              <GoOn order={order} />
            </>
          )}
        </div>
      </Area>
      <Area className="pane stack gap-5">
        {order.draft ? (
          <section className="stack">
            <h2 className="t-head">{words.particulars}</h2>
            <DraftFacts fields={order.draft} zone={zone} />
          </section>
        ) : null}
      </Area>
    </Sheet>
  )
}

/** A signed order as the document it is: read from the signed text alone, checked now. */
export function SignedOrder({
  order,
  versionNo,
  above,
}: {
  order: Order
  versionNo: number | null
  above: ReactNode
}) {
  const version = order.versions.find((one) => one.versionNo === versionNo) ?? order.versions[0]
  const { zone } = useMe().facility
  const record = useMay('dose.record')
  if (!version) return null
  const { signature } = version
  const parsed = SignedBathOrder.safeParse(version.content)
  const content = parsed.success ? parsed.data : null
  const now = new Date().toISOString()
  const next = order.calendar.find((dose) => dose.recorded === null)
  const running = order.phase === 'not-started' || order.phase === 'in-progress' || order.phase === 'held'
  const held = order.phase === 'held' ? order.events.find((event) => event.kind === 'held') : undefined
  return (
    <Sheet recipe="order">
      <Area>
        <Head order={order} more={`, ${orderListWords.version({ n: version.versionNo })}`} />
        {above}
        <BrokenRecord state={signature.state} fault={signature.fault} unreadable={content === null} />
        {version.superseded ? (
          <Notice act={<Link to={paths.order(order.number)}>{words.toCurrent}</Link>}>
            <b>{words.supersededTitle({ n: version.versionNo })}.</b> {words.superseded}
          </Notice>
        ) : null}
        {held ? (
          <Notice>
            <b>
              {words.heldNotice({
                by: held.by,
                at: sayMoment(held.happenedAt, zone, now),
                reason: held.reason === null ? '' : words.because({ reason: held.reason }),
              })}
              .
            </b>{' '}
            {words.noDoseWhileHeld}
          </Notice>
        ) : null}
        {order.draft ? <Notice act={<GoOn order={order} />}>{words.amending}</Notice> : null}
        {content ? (
          <div className="pane">
            <SignedFacts content={content} zone={signature.zone} />
          </div>
        ) : null}
      </Area>
      <Area className="area-order-middle">
        {content ? (
          <>
            <div className="dose-head">
              <div>
                {signature.state === 'intact' ? (
                  <p>{words.each}</p>
                ) : (
                  <p className="text-magenta t-strong">
                    {signature.fault ? faultWords.fromText : faultWords.unknownKey}
                  </p>
                )}
                {content.amount ? (
                  <p>
                    <DoseText text={content.amount.text} size="dose" />
                  </p>
                ) : (
                  <WithheldAmount number={order.number} />
                )}
                <p className="dose-drug">
                  {content.product.establishedName}, {words.routeText}
                </p>
              </div>
              <div>
                {content.water.volumeText === null ? null : (
                  <p>
                    <DoseText text={content.water.volumeText} kind="volume" size="mid" />
                  </p>
                )}
                <p>{words.volume({ code: content.enclosure.code })}</p>
                <p>{content.water.volumeNote}</p>
              </div>
            </div>
            <div className="pane stack gap-5">
              {content.amount &&
              record.allowed &&
              running &&
              next &&
              !version.superseded &&
              signature.state === 'intact' ? (
                <AmountsNow
                  number={order.number}
                  doseKey={next.key}
                  signedText={content.amount.text}
                  allowedPercent={content.fields.allowedVolumeDriftPercent}
                />
              ) : null}
              {content.amount ? (
                <section className="stack">
                  <h2 className="t-head">{words.working}</h2>
                  <OrderWorking lines={content.working} />
                  <AmountNotes amount={content.amount} division={content.fields.division} />
                </section>
              ) : null}
              {version.superseded ? null : (
                <DoseCalendar order={order} zone={zone} now={now} sheets={record.allowed} />
              )}
              <OrderWater water={content.water} valves={content.valves} heading={words.water} />
            </div>
          </>
        ) : (
          <div className="pane stack gap-5">
            <p>{faultWords.noFigures}</p>
            {version.superseded ? null : (
              <DoseCalendar order={order} zone={zone} now={now} sheets={record.allowed} />
            )}
          </div>
        )}
      </Area>
      <Area ground="land" className="area-order-side">
        {content ? (
          <div className="pane stack gap-5">
            <OrderConditions conditions={content.conditions} />
            <SignedCautions content={content} signer={signature.printedName} />
          </div>
        ) : null}
        <div className="pane stack gap-5">
          <OrderSignature signature={signature} stated={content?.relationship ?? null} />
          <OrderActs order={order} version={version.versionNo} />
          <OrderVersions order={order} shown={version.versionNo} zone={zone} />
          <OrderHistory order={order} zone={zone} />
        </div>
      </Area>
    </Sheet>
  )
}

/** The established name of the drug, for titles; the number alone while none is chosen. */
export function orderTitle(order: Order): string {
  return order.agent === null ? order.number : `${order.number}, ${agentNames[order.agent]}`
}
