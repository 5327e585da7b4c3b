import { useState } from 'react'
import { Plus, WifiOff } from 'lucide-react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords as words, timerWords } from '../../../shared/messages/doses-screens.ts'
import { restInTheWay } from '../../../shared/messages/in-the-way.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useUnsent } from '../../lib/stop-entries.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Banner } from '../../ui/banner.tsx'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { PhoneSheet } from '../../ui/phone-frame.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { AdverseEvents } from '../orders/index.ts'
import { DosePicker } from './dose-picker.tsx'
import { FirstCalculation, SecondStanding } from './first-calculation.tsx'
import { GiveForm } from './give-form.tsx'
import { HoldDialog } from './hold-dialog.tsx'
import { useCalculateFirst } from './mutations.ts'
import { PrintLink } from './print-link.tsx'
import { RecordDialog } from './record-dialog.tsx'
import { RecordedDoses } from './recorded-doses.tsx'
import { RunningSteps, RunningTime } from './running-bath.tsx'
import { OtherBaths } from './other-baths.tsx'
import { bathOf, lotToOpen, nextAct, openRecord, openSteps, otherBaths, ownBath } from './sheet-model.ts'
import type { NextAct } from './sheet-model.ts'
import {
  Amounts,
  CautionsNow,
  ReentryNote,
  SignedOverrides,
  Standing,
  StopCriteria,
  WhatGoesIn,
} from './sheet-parts.tsx'
import { SheetSteps } from './sheet-steps.tsx'
import { serverOffsetMs } from './timer-model.ts'
import { UnsentActs } from './unsent-acts.tsx'
import { StopDialog } from './stop-dialog.tsx'
import type { StopKind } from './stop-dialog.tsx'

/** A dialog in front, with the server's time at which it was asked for. */
interface Front {
  what: StopKind | 'hold' | 'record'
  now: string
  /** The dose that is ended, of several that run. */
  doseId?: string
}

/** The sheet with its amounts: conditions, calculations, giving, the running bath, what was recorded. */
export function WholeSheet({
  sheet,
  zone,
  receivedMs,
  chosenLot,
  onLot,
  isKept = false,
  onLookAgain,
}: {
  sheet: BathSheet
  zone: string
  receivedMs: number
  /** The lot in the hand, where somebody chose one; the sheet is judged by it. */
  chosenLot: string | null
  onLot: (lotId: string) => void
  /** Nobody answers, and it stands as it was. */
  isKept?: boolean
  onLookAgain: () => void
}) {
  const [front, setFront] = useState<Front | null>(null)
  const lotId = chosenLot ?? lotToOpen(sheet)
  const act = nextAct(sheet)
  const bath = ownBath(sheet)
  const record = sheet.recorded.find(({ id }) => id === bath?.doseId) ?? openRecord(sheet)
  const running = act === 'running' && record !== null
  const others = otherBaths(sheet)
  const timed = bath ?? (running ? bathOf(record, sheet) : null)
  const keptWords = running ? words.keptSheet : words.keptOther
  const ask = (what: Front['what'], doseId?: string) =>
    setFront({
      what,
      now: new Date(Date.now() + serverOffsetMs(sheet.now, receivedMs)).toISOString(),
      ...(doseId === undefined ? {} : { doseId }),
    })
  const ends = front && (sheet.recorded.find(({ id }) => id === front.doseId) ?? record)
  const isFootEmpty = (act === 'done' || act === 'closed') && !mayHold(sheet)
  const open = act === 'calculate' || act === 'wait-for-second' || act === 'resolve' || act === 'give'
  return (
    <>
      <PhoneSheet
        back={{ to: paths.order(sheet.number), label: words.backToOrder({ number: sheet.number }) }}
        title={words.title({ enclosure: sheet.enclosureCode })}
        under={
          <>
            {sheet.treated.join('; ')}
            <br />
            {words.under({ number: sheet.number, key: sheet.key, doses: sheet.doses })}
          </>
        }
        banner={
          running && timed ? (
            <RunningTime bath={timed} now={sheet.now} zone={zone} receivedMs={receivedMs} />
          ) : undefined
        }
        foot={
          isFootEmpty ? undefined : (
            <Foot
              sheet={sheet}
              act={act}
              lotId={lotId}
              doseId={record?.id ?? null}
              onFront={ask}
              onLookAgain={onLookAgain}
            />
          )
        }
      >
        {isKept ? (
          <Banner icon={WifiOff}>{keptWords({ at: sayMoment(sheet.now, zone, sheet.now) })}</Banner>
        ) : null}
        <UnsentActs number={sheet.number} doseId={record?.id ?? null} zone={zone} now={sheet.now} />
        <Standing sheet={sheet} zone={zone} />
        {others.length > 0 ? (
          <OtherBaths
            number={sheet.number}
            ownKey={sheet.key}
            baths={others}
            now={sheet.now}
            zone={zone}
            receivedMs={receivedMs}
            onEnd={sheet.may.includes('bath.stop') ? (kind, other) => ask(kind, other.doseId) : null}
          />
        ) : null}
        {act === 'in-the-water' ? (
          <section className="sheet-standing">
            <h2 className="t-head">{timerWords.inWater}</h2>
            <p>{timerWords.inWaterBody}</p>
          </section>
        ) : null}
        {running ? null : <DosePicker sheet={sheet} zone={zone} />}
        <ReentryNote sheet={sheet} zone={zone} />
        {act === 'done' ? null : <StopCriteria sheet={sheet} />}
        {running && timed ? <RunningSteps sheet={sheet} record={record} bath={timed} zone={zone} /> : null}
        <WhatGoesIn sheet={sheet} zone={zone} />
        {open ? (
          <>
            <SheetSteps sheet={sheet} lotId={lotId === '' ? null : lotId} />
            <CautionsNow sheet={sheet} />
            <Amounts sheet={sheet} />
            <FirstCalculation sheet={sheet} zone={zone} lotId={lotId} onLot={onLot} />
            <SecondStanding sheet={sheet} zone={zone} />
            <InTheWay sheet={sheet} act={act} />
            {act === 'give' && sheet.may.includes('dose.give') ? (
              <GiveForm sheet={sheet} lotId={lotId} />
            ) : null}
          </>
        ) : null}
        <SignedOverrides sheet={sheet} zone={zone} />
        <RecordedDoses sheet={sheet} zone={zone} />
        {running ? <DosePicker sheet={sheet} zone={zone} /> : null}
        <div className="row row-wrap">
          {sheet.may.includes('dose.record') ? (
            <Button onClick={() => ask('record')}>{words.record}</Button>
          ) : null}
          <PrintLink number={sheet.number} doseKey={sheet.key} />
        </div>
        <AdverseEvents number={sheet.number} doseKey={sheet.key} zone={zone} />
      </PhoneSheet>
      {front?.what === 'hold' ? (
        <HoldDialog number={sheet.number} now={front.now} onBack={() => setFront(null)} />
      ) : null}
      {front?.what === 'record' ? (
        <RecordDialog sheet={sheet} now={front.now} onBack={() => setFront(null)} />
      ) : null}
      {front && front.what !== 'hold' && front.what !== 'record' && ends ? (
        <StopDialog
          doseId={ends.id}
          label={sheet.enclosureCode}
          startedAt={ends.happenedAt}
          kind={front.what}
          now={front.now}
          onBack={() => setFront(null)}
        />
      ) : null}
    </>
  )
}

/** What keeps the dose from being given, where the steps and the calculations do not say it already. */
function InTheWay({ sheet, act }: { sheet: BathSheet; act: NextAct }) {
  const open = openSteps(sheet).filter(({ level }) => level === 'stop').length
  const rest = restInTheWay(sheet)
  if (act === 'give' || open + rest.length === 0) return null
  return (
    <section className="stack" aria-live="polite">
      <h2 className="t-head">{words.inTheWay}</h2>
      <ul className="in-the-way">
        {open > 0 ? <li>{words.conditionsOpen({ count: open })}</li> : null}
        {rest.map((why) => (
          <li key={why}>{why}</li>
        ))}
      </ul>
    </section>
  )
}

const mayHold = (sheet: BathSheet) => sheet.may.includes('order.hold') && sheet.standing === null

/** Within reach of the thumb: the next act, holding, and, while a bath runs, stopping it. */
function Foot({
  sheet,
  act,
  lotId,
  doseId,
  onFront,
  onLookAgain,
}: {
  sheet: BathSheet
  act: NextAct
  lotId: string
  doseId: string | null
  onFront: (what: Front['what']) => void
  onLookAgain: () => void
}) {
  const may = (action: string) => sheet.may.includes(action)
  const unsentStop = useUnsent({ doseId })
  const primary = (
    <Primary sheet={sheet} act={act} lotId={lotId} onFront={onFront} onLookAgain={onLookAgain} />
  )
  const hold = mayHold(sheet) ? (
    <Button kind="hold" size="touch" onClick={() => onFront('hold')}>
      {words.hold}
    </Button>
  ) : null
  if (act === 'running')
    return (
      <>
        <div className="foot-duo">
          <ButtonLink
            kind="primary"
            size="touch"
            icon={Plus}
            to={paths.enclosureMeasure(sheet.enclosureCode)}
          >
            {timerWords.reading}
          </ButtonLink>
          {hold}
        </div>
        {may('bath.stop') && doseId !== null && unsentStop === null ? (
          <div className="foot-duo">
            <Button kind="stop" size="touch" onClick={() => onFront('stop')}>
              {timerWords.stop}
            </Button>
            <Button size="touch" onClick={() => onFront('end')}>
              {timerWords.end}
            </Button>
          </div>
        ) : null}
      </>
    )
  return (
    <div className="foot-duo">
      {primary}
      {hold}
    </div>
  )
}

function Primary({
  sheet,
  act,
  lotId,
  onFront,
  onLookAgain,
}: {
  sheet: BathSheet
  act: NextAct
  lotId: string
  onFront: (what: Front['what']) => void
  onLookAgain: () => void
}) {
  if (act === 'calculate' && sheet.may.includes('dose.give'))
    return <CalculateAct sheet={sheet} lotId={lotId} />
  if (act === 'in-the-water' && sheet.may.includes('bath.stop'))
    return (
      <Button kind="primary" size="touch" onClick={() => onFront('out')}>
        {timerWords.out}
      </Button>
    )
  if (act === 'give' && sheet.may.includes('dose.give'))
    // the act itself stands below the amount that has to be typed
    return (
      <Button
        size="touch"
        kind="primary"
        onClick={() => document.querySelector<HTMLInputElement>('.sheet-give input')?.focus()}
      >
        {words.give}
      </Button>
    )
  if (act === 'done' || act === 'closed' || act === 'in-the-water') return <span />
  return (
    <Button size="touch" onClick={onLookAgain}>
      {words.lookAgain}
    </Button>
  )
}

function CalculateAct({ sheet, lotId }: { sheet: BathSheet; lotId: string }) {
  const calculate = useCalculateFirst({ number: sheet.number, key: sheet.key })
  const refusal = useRefusal()
  const say = useToast()
  const send = async () => {
    if (await refusal.attempt(() => calculate.mutateAsync({ id: newId(), lotId })))
      say({ words: words.calculated })
  }
  return (
    <div className="stack">
      <WrongSummary fields={[]} general={refusal.general([])} />
      <Button
        kind="primary"
        size="touch"
        block
        disabled={refusal.busy}
        shut={lotId === '' ? words.chooseLot : false}
        onClick={() => void send()}
      >
        {sheet.first === null ? words.firstAct : words.firstAgain}
      </Button>
    </div>
  )
}
