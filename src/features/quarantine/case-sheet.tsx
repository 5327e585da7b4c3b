import { useState } from 'react'
import type { ReactNode } from 'react'
import { Plus } from 'lucide-react'
import { Link } from 'react-router-dom'
import { getCertificate } from '../../../shared/contracts/clearance.contract.ts'
import type { CaseStepView } from '../../../shared/contracts/quarantine-primitives.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { clockDecisionWords, quarantineKindWords } from '../../../shared/messages/quarantine.ts'
import { caseWords as words } from '../../../shared/messages/quarantine-case.ts'
import { quarantineWords } from '../../../shared/messages/quarantine-screens.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { addressOf } from '../../lib/api-client.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Facts } from '../../ui/facts.tsx'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { PassageCase } from '../../ui/passage/passage-case.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { OrderSignature } from '../orders/index.ts'
import { CloseDialog, MemberDialog } from './batch-dialogs.tsx'
import { BeforeClearance } from './before-clearance.tsx'
import { BatchTable, DeathList, EventTable, ExtensionList, LockList } from './case-records.tsx'
import { CaseSteps, recordable } from './case-steps.tsx'
import { CauseDialog } from './cause-dialog.tsx'
import { headlineReason, sayReason } from './clock-sentences.ts'
import { DecideDialog } from './decide-dialog.tsx'
import { HoldDialog, LiftDialog, LockDialog } from './hold-dialogs.tsx'
import { ObservationLog } from './observation-log.tsx'
import { OpenCalls } from './open-calls.tsx'
import { OrdersHere } from './orders-here.tsx'
import {
  animalsText,
  caseSpan,
  clearanceDisagrees,
  flagOfCase,
  hasEnded,
  passageOfCase,
  stateOfCase,
} from './passage-of-case.ts'
import { ReportDialog } from './report-dialog.tsx'
import { ResultDialog } from './result-dialog.tsx'
import { StepDialog } from './step-dialog.tsx'

type Open =
  | { kind: 'report' | 'decide' | 'hold' | 'lock' | 'close' | 'member' | 'result' }
  | { kind: 'step'; step: CaseStepView }
  | { kind: 'lift'; lock: CaseDetail['locks'][number] }
  | { kind: 'cause'; death: CaseDetail['deaths'][number] }

/** One quarantine case: its clock explained, its passage, its steps, what stands against clearance, and what was seen. */
export function CaseSheet({ of: detail, above }: { of: CaseDetail; above?: ReactNode }) {
  const { zone } = useMe().facility
  const [open, setOpen] = useState<Open | null>(null)
  const maySteps = useMay('sample.take')
  const mayLift = useMay('hold.lift')
  const maySign = useMay('necropsy.sign')
  const mayClear = useMay('case.clear')
  const today = facilityDateOf(detail.asOf, zone)
  const view = passageOfCase(detail, detail.names, today)
  const running = !hasEnded(detail)
  const stepOf = (fixId: string | undefined) => {
    const steps = detail.legs.find((leg) => leg.endedOn === null)?.steps ?? []
    return steps.find((step) => fixId?.endsWith(` ${step.key}`) && recordable(step))
  }

  return (
    <Sheet recipe="list-log">
      <Area>
        {above}
        <OpenCalls number={detail.number} />
        <CaseHead of={detail} zone={zone} onOpen={setOpen} />
        <Changes of={detail} zone={zone} />
        {view.legs.length > 0 ? (
          <PassageCase
            view={view}
            {...caseSpan(view)}
            onOpenFix={([first]) => {
              const step = stepOf(first)
              if (step && running && maySteps.allowed) setOpen({ kind: 'step', step })
              else document.getElementById('case-steps')?.scrollIntoView({ block: 'start' })
            }}
          />
        ) : null}
        <div className="case-lower">
          <CaseSteps
            of={detail}
            today={today}
            mayRecord={running && maySteps.allowed}
            onRecord={(step) => setOpen({ kind: 'step', step })}
          />
          <div className="stack">
            <BeforeClearance of={detail} whyNot={mayClear.why} />
            <Clearance of={detail} />
          </div>
        </div>
        <div className="case-more">
          <LockList
            of={detail}
            zone={zone}
            onLift={mayLift.allowed ? (lock) => setOpen({ kind: 'lift', lock }) : undefined}
          />
          <ExtensionList of={detail} />
          <OrdersHere enclosures={detail.enclosures} />
          <DeathList
            of={detail}
            onSign={maySign.allowed ? (death) => setOpen({ kind: 'cause', death }) : undefined}
          />
          <BatchTable of={detail} zone={zone} />
          <EventTable of={detail} zone={zone} />
        </div>
      </Area>
      <ObservationLog
        number={detail.number}
        day0On={detail.day0On}
        foot={detail.enclosures.map((code) => (
          <ButtonLink key={code} to={paths.observe(code)}>
            {detail.enclosures.length === 1 ? words.observe : words.observeIn({ code })}
          </ButtonLink>
        ))}
      />
      {open ? <CaseDialog of={detail} zone={zone} open={open} onBack={() => setOpen(null)} /> : null}
    </Sheet>
  )
}

function CaseHead({
  of: detail,
  zone,
  onOpen,
}: {
  of: CaseDetail
  zone: string
  onOpen: (open: Open) => void
}) {
  const reason = headlineReason(detail.reasons)
  const paused = detail.runningPauses[0]
  const say = (on: string | null) => (on === null ? words.notSet : sayDate(on))
  return (
    <div className="case-head">
      <Cartouche
        place={
          <>
            <Link to={paths.quarantine()}>{quarantineWords.title}</Link> / {detail.number}
          </>
        }
        title={detail.name}
        source={sourceText(detail)}
        flag={<FlagWords flag={flagOfCase(detail)}>{stateOfCase(detail)}</FlagWords>}
      />
      <div className="case-day">
        <b aria-hidden="true">{detail.dayNumber ?? '–'}</b>
        <span>
          {detail.dayNumber === null
            ? words.notBegun
            : words.dayOf({ day: detail.dayNumber, length: detail.requiredDays })}
        </span>
      </div>
      <section className="case-clock" aria-label={words.clock}>
        {clearanceDisagrees(detail) ? (
          <p className="text-magenta t-strong" role="alert">
            {words.clearanceDisagrees}
          </p>
        ) : null}
        {reason ? <h2 className="t-head">{sayReason(reason, detail.names, zone)}</h2> : null}
        {paused ? (
          <p className="t-strong">{words.standsStill({ at: sayMoment(paused.since, zone, detail.asOf) })}</p>
        ) : null}
        {detail.decisionsDue.length > 0 ? (
          <ul className="stack gap-2" aria-label={words.decisionsDue}>
            {detail.decisionsDue.map(({ code, eventId }) => (
              <li key={`${code} ${eventId}`} className="t-strong">
                {clockDecisionWords[code]}
              </li>
            ))}
          </ul>
        ) : null}
        {detail.sharesWaterWith.length > 0 ? (
          <p>{words.sharesWater({ cases: detail.sharesWaterWith.join(', ') })}</p>
        ) : null}
        {detail.protocol.confirmed ? null : <p className="t-note">{words.protocolUnconfirmed}</p>}
        <CaseActs of={detail} onOpen={onOpen} />
      </section>
      <div className="case-facts">
        <Facts
          of={[
            [words.day0, say(detail.day0On)],
            [words.requiredDays, String(detail.requiredDays)],
            [words.pausedDays, String(detail.pausedDays)],
            [words.earliest, <b key="earliest">{say(detail.earliestClearanceOn)}</b>],
            [words.lastEntry, say(detail.lastEntryOn)],
          ]}
        />
        <p className="t-note pt-2">
          {words.openedBy({ by: detail.openedBy, on: sayMoment(detail.openedAt, zone, detail.asOf) })}
        </p>
      </div>
    </div>
  )
}

/** What may be done with a case; what this person may not do is not among them, but holding always is. */
function CaseActs({ of: detail, onOpen }: { of: CaseDetail; onOpen: (open: Open) => void }) {
  const hold = useMay('case.hold')
  const report = useMay('clock.report')
  const configure = useMay('case.configure')
  const lock = useMay('case.lock')
  const opens = useMay('case.open')
  const results = useMay('result.enter')
  if (hasEnded(detail)) return null
  return (
    <div className="row row-wrap">
      {hold.allowed ? (
        <Button kind="hold" onClick={() => onOpen({ kind: 'hold' })}>
          {words.hold}
        </Button>
      ) : null}
      {report.allowed ? <Button onClick={() => onOpen({ kind: 'report' })}>{words.report}</Button> : null}
      {results.allowed ? <Button onClick={() => onOpen({ kind: 'result' })}>{words.result}</Button> : null}
      {configure.allowed ? <Button onClick={() => onOpen({ kind: 'decide' })}>{words.decide}</Button> : null}
      {lock.allowed ? <Button onClick={() => onOpen({ kind: 'lock' })}>{words.lock}</Button> : null}
      {opens.allowed ? (
        <Button icon={Plus} onClick={() => onOpen({ kind: 'member' })}>
          {words.addMember}
        </Button>
      ) : null}
      {opens.allowed && detail.status === 'open' ? (
        <Button kind="primary" onClick={() => onOpen({ kind: 'close' })}>
          {words.closeBatch}
        </Button>
      ) : null}
    </div>
  )
}

/** Every change of the clock in time order; what no longer counts stays readable and says so. */
function Changes({ of: detail, zone }: { of: CaseDetail; zone: string }) {
  if (detail.reasons.length === 0) return null
  return (
    <details className="case-changes">
      <summary>{words.changes({ count: detail.reasons.length })}</summary>
      <ol>
        {detail.reasons.map((reason, i) => (
          <li
            key={`${reason.eventId} ${reason.code} ${String(i)}`}
            className={reason.standing ? undefined : 't-2'}
          >
            {reason.standing ? null : words.noLonger}
            {sayReason(reason, detail.names, zone)}
          </li>
        ))}
      </ol>
    </details>
  )
}

function Clearance({ of: detail }: { of: CaseDetail }) {
  const { clearance } = detail
  const mayPrint = useMay('register.read')
  if (!clearance) return null
  return (
    <section className="stack" aria-labelledby="case-clearance">
      <h2 id="case-clearance" className="t-head">
        {words.clearance}
      </h2>
      {clearanceDisagrees(detail) ? null : <p>{words.cleared({ on: sayDate(clearance.on) })}</p>}
      {clearance.against > 0 ? (
        <p>{words.against({ count: clearance.against, reason: clearance.reason ?? '' })}</p>
      ) : null}
      <OrderSignature signature={clearance.signature} />
      {mayPrint.allowed ? (
        <a className="btn" href={addressOf(getCertificate, { number: detail.number })} download>
          {words.certificate}
        </a>
      ) : null}
    </section>
  )
}

function CaseDialog({
  of: detail,
  zone,
  open,
  onBack,
}: {
  of: CaseDetail
  zone: string
  open: Open
  onBack: () => void
}) {
  const { number } = detail
  switch (open.kind) {
    case 'report':
      return <ReportDialog of={detail} zone={zone} onBack={onBack} />
    case 'decide':
      return <DecideDialog of={detail} onBack={onBack} />
    case 'hold':
      return <HoldDialog number={number} onBack={onBack} />
    case 'lock':
      return <LockDialog number={number} onBack={onBack} />
    case 'close':
      return <CloseDialog number={number} onBack={onBack} />
    case 'member':
      return <MemberDialog number={number} zone={zone} onBack={onBack} />
    case 'result':
      return <ResultDialog of={detail} onBack={onBack} />
    case 'step':
      return <StepDialog number={number} step={open.step} onBack={onBack} />
    case 'lift':
      return <LiftDialog number={number} lock={open.lock} onBack={onBack} />
    case 'cause':
      return <CauseDialog number={number} death={open.death} onBack={onBack} />
  }
}

/** Who is in the case, where, and under which protocol. */
function sourceText(detail: CaseDetail): string {
  const numbers = detail.batch.map(({ accession }) => accession)
  const accessions =
    numbers.length > 2
      ? words.manyAccessions({
          first: numbers[0] ?? '',
          last: numbers.at(-1) ?? '',
          count: numbers.length,
        })
      : numbers.join(', ')
  const { code, version } = detail.protocol
  return words.source({
    animals: animalsText(detail.animals),
    accessions,
    places: detail.enclosures.join(', ') || (hasEnded(detail) ? words.caseEnded : words.inNoEnclosure),
    kind: quarantineKindWords[detail.quarantineKind],
    protocol: words.protocolName({ code, version, days: detail.requiredDays }),
  })
}
