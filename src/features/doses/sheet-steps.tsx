import type { ReactNode } from 'react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Conditions } from '../../ui/condition-row.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useNoteLot } from './mutations.ts'
import { OverrideAct } from './override-dialog.tsx'

type Step = BathSheet['steps'][number]

/** What has to be true before the first gram, judged now; whatever is not leads to where it is resolved. */
export function SheetSteps({ sheet, lotId }: { sheet: BathSheet; lotId: string | null }) {
  if (sheet.steps.length === 0) return null
  return (
    <Conditions
      heading={words.conditions}
      note={words.conditionsNote}
      conditions={sheet.steps.map((step) => ({
        key: step.ruleId,
        state: step.state === 'met' ? 'met' : step.state === 'unknown' ? 'open' : 'unmet',
        what: step.text,
        known: knownOf(step, sheet, lotId),
      }))}
    />
  )
}

/** What is said below a step: a limit that was changed since, and what is open. */
function knownOf(step: Step, sheet: BathSheet, lotId: string | null): ReactNode {
  if (step.state !== 'met') return <OpenStep step={step} sheet={sheet} lotId={lotId} />
  return step.changed.length > 0 ? <Changed step={step} /> : undefined
}

/** The step shows the limit that was signed; another one in force stands apart from it. */
const Changed = ({ step }: { step: Step }) =>
  step.changed.map((sentence) => (
    <span key={sentence} className="block">
      {sentence}
    </span>
  ))

function OpenStep({ step, sheet, lotId }: { step: Step; sheet: BathSheet; lotId: string | null }) {
  return (
    <span className="open-step">
      {step.help === null ? null : <span>{step.help}</span>}
      <Changed step={step} />
      {step.overridden ? (
        <Overridden step={step} sheet={sheet} />
      ) : (
        <WhereToResolve step={step} sheet={sheet} lotId={lotId} />
      )}
      {stopsOf(sheet, step).map((stop) => (
        <OverrideAct key={stop.text} sheet={sheet} stop={stop} />
      ))}
    </span>
  )
}

/** The stops that a step stands for. */
const stopsOf = (sheet: BathSheet, step: Step) =>
  sheet.cautions.filter(({ ruleId, level }) => ruleId === step.ruleId && level === 'stop')

function Overridden({ step, sheet }: { step: Step; sheet: BathSheet }) {
  return stopsOf(sheet, step).map(({ text, overridden }) =>
    overridden ? (
      <span key={text} className="t-strong">
        {orderViewWords.overridden({ name: overridden.by, reason: overridden.reason })}
      </span>
    ) : null,
  )
}

function WhereToResolve({ step, sheet, lotId }: { step: Step; sheet: BathSheet; lotId: string | null }) {
  const { number, key, enclosureCode } = sheet
  switch (step.place) {
    case 'readings':
      return <ButtonLink to={paths.enclosureMeasure(enclosureCode)}>{words.toReadings}</ButtonLink>
    case 'volume':
      return <ButtonLink to={paths.enclosureVolumes(enclosureCode)}>{words.toVolume}</ButtonLink>
    case 'water':
      return <ButtonLink to={paths.enclosure(enclosureCode)}>{words.toWater}</ButtonLink>
    case 'animals':
      return (
        <span className="open-step">
          <span>{step.resolve.join(' ')}</span>
          <ButtonLink to={paths.observe(enclosureCode)}>{words.toAnimals}</ButtonLink>
        </span>
      )
    case 'second-calculation':
      return sheet.first === null || sheet.first.mine ? null : (
        <ButtonLink to={`${paths.orderSheet(number)}?dose=${key}&part=second`}>{words.toSecond}</ButtonLink>
      )
    case 'lot':
      return sheet.may.includes('dose.give') ? <LookAtBottle lotId={lotId} /> : null
    default:
      return step.resolve.length > 0 ? <span>{step.resolve.join(' ')}</span> : null
  }
}

/** What somebody sees at the bottle in the hand; it counts for the day. */
function LookAtBottle({ lotId }: { lotId: string | null }) {
  const note = useNoteLot()
  const refusal = useRefusal()
  const say = useToast()
  if (lotId === null) return <span>{words.bottleNoLot}</span>
  const send = async (kind: 'looked-at' | 'precipitate' | 'stored-cold') => {
    const body = { lotId, id: newId(), kind, happenedAt: new Date().toISOString() }
    if (await refusal.attempt(() => note.mutateAsync(body))) say({ words: words.bottleNoted })
  }
  return (
    <span className="open-step">
      <WrongSummary fields={[]} general={refusal.general([])} />
      <Button disabled={refusal.busy} onClick={() => void send('looked-at')}>
        {words.bottleClear}
      </Button>
      <Button disabled={refusal.busy} onClick={() => void send('precipitate')}>
        {words.bottleWhite}
      </Button>
      <Button disabled={refusal.busy} onClick={() => void send('stored-cold')}>
        {words.bottleCold}
      </Button>
    </span>
  )
}
