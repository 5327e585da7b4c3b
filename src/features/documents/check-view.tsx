import type { CheckedFingerprint } from '../../../shared/contracts/documents.contract.ts'
import { formatFingerprint } from '../../../shared/domain/documents/format-fingerprint.ts'
import { checkWords as words } from '../../../shared/messages/documents-sheet.ts'
import { sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { useMe } from '../../lib/me.ts'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'

type Print = CheckedFingerprint['prints'][number]

const kindNames: Record<string, () => string> = {
  'acquisition-history': () => words['acquisition-history'],
  'treatment-order': () => words['treatment-order'],
  'bath-sheet': () => words['bath-sheet'],
  'order-label': () => words['order-label'],
  clearance: () => words.clearance,
}

/** The answer about a print: whether the record still stands, and every time it was printed. */
export function CheckView({ found }: { found: CheckedFingerprint }) {
  const { zone } = useMe().facility
  const good = found.state === 'current'
  const whole = formatFingerprint(found.fingerprint, 16)
  const [newest] = found.prints
  const columns: TableColumn<Print>[] = [
    { id: 'document', heading: words.document, cell: (row) => kindNames[row.kind]?.() ?? row.kind },
    { id: 'subject', heading: words.subject, cell: (row) => row.subject },
    { id: 'version', heading: words.version, cell: (row) => row.version },
    { id: 'by', heading: words.printedBy, cell: (row) => row.printedBy },
    { id: 'at', heading: words.printedAt, cell: (row) => sayInstantWithOffset(row.printedAt, zone) },
  ]
  return (
    <div className="stack gap-6">
      <div role="status" className="stack">
        <p className="t-head">
          <FlagWords flag={good ? 'C' : 'N'}>{words[found.state]}</FlagWords>
        </p>
        {found.state === 'changed' && found.now !== null ? (
          <p>{words.changedNow({ then: newest?.version ?? '', now: found.now })}</p>
        ) : found.now !== null ? (
          <p>{words.versionNow({ now: found.now })}</p>
        ) : null}
        {good ? null : <p>{words.doNotUse}</p>}
      </div>
      <section className="stack">
        <h2 className="t-head">{words.prints}</h2>
        <DataTable
          label={words.prints}
          columns={columns}
          rows={found.prints}
          rowKey={(row) => `${row.printedAt} ${row.printedBy}`}
        />
      </section>
      <section>
        <h2 className="t-label">{words.fingerprint}</h2>
        <p className="fingerprint">{whole.ok ? whole.value : found.fingerprint}</p>
      </section>
    </div>
  )
}
