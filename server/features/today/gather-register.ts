import type { PermitRow } from '../../../shared/contracts/permits.contract.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import type { Acquisitions } from '../acquisitions/index.ts'
import type { Permits } from '../permits/index.ts'
import { onDays, waiting } from './work.ts'
import type { Moment } from './work.ts'

const mostOfAKind = 50
const mostUnfinished = 1000
const mostPaperless = 5

type Unfinished = Awaited<ReturnType<Acquisitions['unfinished']>>[number]

/** What the registrar has to see to: permits that end or were overdrawn, transactions without papers. */
export async function gatherRegister(
  parts: { permits: Permits; acquisitions: Acquisitions },
  moment: Moment,
): Promise<TodayWork[]> {
  const page = { offset: 0, limit: mostOfAKind }
  const [ending, marked, unfinished] = await Promise.all([
    parts.permits.queries.permits({ ...page, state: 'runs-out', sort: 'validUntil' }),
    parts.permits.queries.permits({ ...page, open: 'yes' }),
    parts.acquisitions.unfinished(mostUnfinished),
  ])
  return [
    ...ending.rows.map((row) =>
      onDays(
        {
          id: `permit-runs-out:${row.number}`,
          kind: 'permit-runs-out',
          dueOn: moment.on,
          latestOn: row.validUntil,
          params: permitParams(row),
        },
        moment,
      ),
    ),
    ...marked.rows.map((row) =>
      waiting({
        id: `permit-marks:${row.number}`,
        kind: 'permit-marks',
        params: { ...permitParams(row), marks: row.openMarks },
      }),
    ),
    ...unfinished
      .filter((row) => row.open_marks > 0)
      .map((row) =>
        waiting({
          id: `transaction-marks:${row.number}`,
          kind: 'transaction-marks',
          at: row.happened_at.toISOString(),
          params: transactionParams(row),
        }),
      ),
    ...paperless(unfinished.filter((row) => row.documents === 0 && row.counterparty_name !== null)),
  ]
}

/** A few transactions without papers are named; many are one piece of work, or they would hide everything else. */
function paperless(rows: readonly Unfinished[]): TodayWork[] {
  const [oldest] = rows
  if (oldest === undefined) return []
  const shown = rows.length > mostPaperless ? [oldest] : rows
  return shown.map((row) =>
    waiting({
      id: `transaction-papers:${row.number}`,
      kind: 'transaction-papers',
      at: row.happened_at.toISOString(),
      params: { ...transactionParams(row), ...(shown === rows ? {} : { count: rows.length }) },
    }),
  )
}

const transactionParams = (row: Unfinished) => ({
  number: row.number,
  kind: row.kind,
  way: row.way,
  party: row.counterparty_name ?? '',
  marks: row.open_marks,
  animal: [row.accession, row.common_name].filter(Boolean).join(' '),
  on: row.happened_on,
})

const permitParams = (row: PermitRow) => ({
  number: row.number,
  permit: row.permitNumber,
  authority: row.authority,
  days: row.daysLeft,
})
