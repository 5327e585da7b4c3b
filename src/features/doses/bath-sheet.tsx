import { useEffect, useState } from 'react'
import { useQuery, useQueryClient } from '@tanstack/react-query'
import { Navigate } from 'react-router-dom'
import type { UseQueryResult } from '@tanstack/react-query'
import type { BathSheet as BathSheetReply } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { PhoneSheet } from '../../ui/phone-frame.tsx'
import { HoldDialog } from './hold-dialog.tsx'
import { keepRunning, keptRunningQuery, sheetQuery } from './queries.ts'
import { SecondCalculation } from './second-calculation.tsx'
import { doseToOpen, othersMayAct, sheetMode, waitsForOthers } from './sheet-model.ts'
import type { SheetPart } from './sheet-model.ts'
import { ReentryNote, StopCriteria } from './sheet-parts.tsx'
import { UnsentActs } from './unsent-acts.tsx'
import { WholeSheet } from './whole-sheet.tsx'

/** While a second person calculates or a bath runs, somebody else may act at any moment. */
const lookAgainMs = 5_000

/**
 * The bath sheet of one planned dose. The sheet without amounts is read first: whoever may be the second person is shown
 * that one, and the amounts do not reach their device.
 */
export function BathSheet({ number, doseKey, part }: { number: string; doseKey: string; part: SheetPart }) {
  const { zone } = useMe().facility
  const dose = `${number} ${doseKey}`
  const [chosen, setChosen] = useState<{ dose: string; lotId: string } | null>(null)
  // a lot is chosen for one dose
  const lotId = chosen?.dose === dose ? chosen.lotId : null
  // while it is judged by another lot, what stood there stays
  const placeholderData = (previous: BathSheetReply | undefined) =>
    previous?.number === number && previous.key === doseKey ? previous : undefined
  const blind = useQuery({
    ...sheetQuery(number, doseKey, true, lotId),
    placeholderData,
    refetchInterval: ({ state }) => (looksAgain(state.data, state.error) ? lookAgainMs : false),
  })
  const mode = blind.data ? sheetMode(blind.data, part) : null
  const whole = useQuery({
    ...sheetQuery(number, doseKey, false, lotId),
    placeholderData,
    enabled: mode === 'whole',
    refetchInterval: ({ state }) => (state.data && othersMayAct(state.data) ? lookAgainMs : false),
  })
  const query = mode === 'whole' ? whole : blind
  const running = query.data?.state === 'running' ? query.data : null
  const receivedMs = query.dataUpdatedAt
  useEffect(() => {
    if (running) void keepRunning(running, receivedMs)
  }, [running, receivedMs])
  useKeptRunning(number, doseKey, isUnanswered(blind.error) && !blind.data)
  if (!query.data) return <NotYet number={number} query={query} doseKey={doseKey} />
  if (mode === 'blind') return <BlindSheet sheet={query.data} zone={zone} />
  return (
    <WholeSheet
      key={dose}
      sheet={query.data}
      zone={zone}
      receivedMs={receivedMs}
      chosenLot={lotId}
      onLot={(next) => setChosen({ dose, lotId: next })}
      isKept={isUnanswered(query.error)}
      onLookAgain={() => void query.refetch()}
    />
  )
}

const isUnanswered = (error: Error | null) => isProblem(error) && error.noAnswer

/** When nobody answers at the start, the bath that runs stands as it was kept, and goes on from there. */
function useKeptRunning(number: string, doseKey: string, wanted: boolean): void {
  const client = useQueryClient()
  const { data: kept } = useQuery({ ...keptRunningQuery(number, doseKey), enabled: wanted })
  useEffect(() => {
    if (wanted && kept)
      client.setQueryData(sheetQuery(number, doseKey, true).queryKey, kept.value, {
        updatedAt: Date.parse(kept.at),
      })
  }, [client, number, doseKey, wanted, kept])
}

/** Whether the sheet is read again by itself: somebody else may act on it, or nobody answered. */
function looksAgain(sheet: BathSheetReply | undefined, error: Error | null): boolean {
  if (isUnanswered(error)) return true
  if (sheet === undefined) return false
  return waitsForOthers(sheet) || ((!sheet.blind || sheet.state === 'running') && othersMayAct(sheet))
}

/** The sheet of an order without a dose in its address: leads to the dose that is meant now. */
export function DoseOfNow({ number }: { number: string }) {
  const query = useQuery(sheetQuery(number, '1', true))
  if (!query.data) return <NotYet number={number} query={query} />
  const { running, calendar } = query.data
  const key = running[0]?.key ?? doseToOpen(calendar) ?? '1'
  return <Navigate to={`${paths.orderSheet(number)}?dose=${key}`} replace />
}

/** The sheet of the second person. Holding is in reach here too: whoever reads the label may see what is wrong. */
function BlindSheet({ sheet, zone }: { sheet: BathSheetReply; zone: string }) {
  const [holdAt, setHoldAt] = useState<string | null>(null)
  const mayHold = sheet.may.includes('order.hold') && sheet.standing === null
  return (
    <>
      <PhoneSheet
        back={{ to: paths.order(sheet.number), label: words.backToOrder({ number: sheet.number }) }}
        title={words.blindTitle}
        under={words.under({ number: sheet.number, key: sheet.key, doses: sheet.doses })}
        foot={
          mayHold ? (
            <Button kind="hold" size="touch" onClick={() => setHoldAt(new Date().toISOString())}>
              {words.hold}
            </Button>
          ) : undefined
        }
      >
        <UnsentActs number={sheet.number} doseId={null} zone={zone} now={sheet.now} />
        <SecondCalculation sheet={sheet} zone={zone} />
        <ReentryNote sheet={sheet} zone={zone} />
        <StopCriteria sheet={sheet} />
      </PhoneSheet>
      {holdAt === null ? null : (
        <HoldDialog number={sheet.number} now={holdAt} onBack={() => setHoldAt(null)} />
      )}
    </>
  )
}

function NotYet({
  number,
  doseKey = null,
  query,
}: {
  number: string
  doseKey?: string | null
  query: UseQueryResult<BathSheetReply>
}) {
  const problem = isProblem(query.error) ? query.error : null
  const missing = problem?.code === 'not-found' || problem?.code === 'bad-input'
  // while it is asked again, what stands stays: somebody may be stopping the bath
  const [unanswered, setUnanswered] = useState(false)
  if (problem && problem.noAnswer !== unanswered) setUnanswered(problem.noAnswer)
  if (unanswered && doseKey !== null)
    return <WithoutAnswer number={number} onRetry={() => void query.refetch()} />
  return (
    <PhoneSheet
      back={{ to: paths.order(number), label: words.backToOrder({ number }) }}
      title={words.sheetOf({ number })}
    >
      {problem ? (
        <ListUnreadable
          {...(missing ? { title: words.noSuchDose } : {})}
          why={problem.says}
          code={problem.requestId}
          onRetry={() => void query.refetch()}
          act={<ButtonLink to={paths.order(number)}>{words.backToOrder({ number })}</ButtonLink>}
        />
      ) : (
        <ListFetching what={number} />
      )}
    </PhoneSheet>
  )
}

/** Nobody answers, and no running bath was kept: nothing but the hold, which needs no answer. */
function WithoutAnswer({ number, onRetry }: { number: string; onRetry: () => void }) {
  const { zone } = useMe().facility
  const hold = useMay('order.hold')
  const [holdAt, setHoldAt] = useState<string | null>(null)
  const now = new Date().toISOString()
  return (
    <>
      <PhoneSheet
        back={{ to: paths.order(number), label: words.backToOrder({ number }) }}
        title={words.sheetOf({ number })}
        foot={
          hold.allowed ? (
            <Button kind="hold" size="touch" onClick={() => setHoldAt(now)}>
              {words.hold}
            </Button>
          ) : undefined
        }
      >
        <UnsentActs number={number} doseId={null} zone={zone} now={now} />
        <ListUnreadable why={words.holdBlind} onRetry={onRetry} />
      </PhoneSheet>
      {holdAt === null ? null : <HoldDialog number={number} now={holdAt} onBack={() => setHoldAt(null)} />}
    </>
  )
}
