import { useEffect, useState } from 'react'
import { useQuery } from '@tanstack/react-query'
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
import { StopCriteria } from './sheet-parts.tsx'
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
  const blind = useQuery({
    ...sheetQuery(number, doseKey, true),
    refetchInterval: ({ state }) => (looksAgain(state.data, state.error !== null) ? lookAgainMs : false),
  })
  const mode = blind.data ? sheetMode(blind.data, part) : null
  const whole = useQuery({
    ...sheetQuery(number, doseKey, false),
    enabled: mode === 'whole',
    refetchInterval: ({ state }) => (state.data && othersMayAct(state.data) ? lookAgainMs : false),
  })
  const query = mode === 'whole' ? whole : blind
  const running = query.data?.state === 'running' ? query.data : null
  useEffect(() => {
    if (running) void keepRunning(running)
  }, [running])
  if (!query.data) return <NotYet number={number} query={query} doseKey={doseKey} />
  if (mode === 'blind') return <BlindSheet sheet={query.data} zone={zone} />
  return (
    <WholeSheet
      key={`${number} ${doseKey}`}
      sheet={query.data}
      zone={zone}
      receivedMs={query.dataUpdatedAt}
      onLookAgain={() => void query.refetch()}
    />
  )
}

/** Whether the sheet is read again by itself: somebody else may act on it, or nobody answered. */
function looksAgain(sheet: BathSheetReply | undefined, failed: boolean): boolean {
  if (failed || sheet === undefined) return failed
  return waitsForOthers(sheet) || (!sheet.blind && othersMayAct(sheet))
}

/** The sheet of an order without a dose in its address: leads to the dose that is meant now. */
export function DoseOfNow({ number }: { number: string }) {
  const query = useQuery(sheetQuery(number, '1', true))
  if (!query.data) return <NotYet number={number} query={query} />
  const key = doseToOpen(query.data.calendar) ?? '1'
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
  if (problem?.noAnswer && doseKey !== null)
    return <WithoutAnswer number={number} doseKey={doseKey} onRetry={() => void query.refetch()} />
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

/** Nobody answers: the bath that runs as it was kept, else nothing but the hold, which needs no answer. */
function WithoutAnswer({
  number,
  doseKey,
  onRetry,
}: {
  number: string
  doseKey: string
  onRetry: () => void
}) {
  const { zone } = useMe().facility
  const hold = useMay('order.hold')
  const kept = useQuery(keptRunningQuery(number, doseKey))
  const [holdAt, setHoldAt] = useState<string | null>(null)
  const now = new Date().toISOString()
  if (kept.data)
    return (
      <WholeSheet
        sheet={kept.data.value}
        zone={zone}
        receivedMs={Date.parse(kept.data.at)}
        isKept
        onLookAgain={onRetry}
      />
    )
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
