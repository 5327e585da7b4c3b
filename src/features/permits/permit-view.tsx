import { useState } from 'react'
import { Link } from 'react-router-dom'
import { attachPermitDocument } from '../../../shared/contracts/permits.contract.ts'
import type { Permit, PermitUse } from '../../../shared/contracts/permits.contract.ts'
import { permitWords as words } from '../../../shared/messages/permits-sheet.ts'
import {
  permitKindNames,
  permitMarkNames,
  purposeCodeNames,
} from '../../../shared/messages/register-kinds.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { sayNumber } from '../../lib/say-number.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import { Facts } from '../../ui/facts.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { Tag } from '../../ui/tag.tsx'
import { Papers } from '../documents/index.ts'
import { useExplainUse, useVoidPermit } from './mutations.ts'
import { PermitState } from './permit-state.tsx'
import { permitsKey } from './queries.ts'
import { UseUp } from './use-up.tsx'

/** What the permit says, beside its number. */
export function PermitFacts({ permit }: { permit: Permit }) {
  const purpose = permit.purposeCode as keyof typeof purposeCodeNames | null
  const facts: [string, React.ReactNode][] = [
    [words.permitNumber, permit.permitNumber],
    [words.authority, permit.authority],
    [words.kind, permitKindNames[permit.kind]],
    [words.valid, words.validity({ from: permit.validFrom, until: permit.validUntil })],
    [words.state, <PermitState key="state" permit={permit} />],
    [words.used, <UseUp key="used" used={permit.used} allowed={permit.quantityAllowed} />],
    [words.taxa, permit.taxa.map((taxon) => taxon.commonName).join(', ') || words.anyTaxon],
    ...(permit.counterparty ? [[words.party, permit.counterparty.name] as [string, string]] : []),
    ...(purpose ? [[words.purpose, purposeCodeNames[purpose]] as [string, string]] : []),
    ...(permit.conditions ? [[words.conditions, permit.conditions] as [string, string]] : []),
  ]
  return <Facts of={facts} />
}

/** What was taken under the permit, with what it does not cover to be explained, and its papers. */
export function PermitView({ permit }: { permit: Permit }) {
  const mayManage = permit.may.includes('register.manage')
  const [explaining, setExplaining] = useState<{ use: PermitUse; key: string } | null>(null)
  const explain = useExplainUse(permit.number)
  const columns: TableColumn<PermitUse>[] = [
    {
      id: 'transaction',
      heading: words.transaction,
      cell: (row) => <Link to={paths.transaction(row.transaction)}>{row.transaction}</Link>,
    },
    { id: 'date', heading: words.date, cell: (row) => <span className="num">{sayDate(row.on)}</span> },
    {
      id: 'animal',
      heading: words.animal,
      cell: (row) => (
        <>
          <Link to={paths.history(row.accession)}>{row.accession}</Link> {row.commonName}
        </>
      ),
    },
    { id: 'taken', heading: words.taken, number: true, cell: (row) => sayNumber(row.quantity) },
    {
      id: 'left',
      heading: words.left,
      number: true,
      cell: (row) => (row.remaining === null ? words.noNumberStated : sayNumber(row.remaining)),
    },
    {
      id: 'remarks',
      heading: words.remarks,
      cell: (row) => (
        <Remarks
          use={row}
          onExplain={mayManage ? () => setExplaining({ use: row, key: newId() }) : undefined}
        />
      ),
    },
  ]
  return (
    <div className="stack gap-6">
      <section className="stack">
        <h2 className="t-head">{words.useUp}</h2>
        <DataTable
          label={words.useUp}
          columns={columns}
          rows={permit.uses}
          rowKey={(row) => row.id}
          instead={permit.uses.length === 0 ? <p className="t-2 py-3">{words.noUses}</p> : undefined}
        />
      </section>
      <section className="stack">
        <h2 className="t-head">{words.papers}</h2>
        <Papers
          papers={permit.papers}
          mayAttach={permit.may.includes('document.attach')}
          target={{
            contract: attachPermitDocument,
            params: { number: permit.number },
            readAgain: permitsKey,
          }}
        />
      </section>
      {mayManage && permit.voided === null ? <VoidPermit permit={permit} /> : null}
      {explaining ? (
        <ReasonDialog
          question={words.explainQuestion({ transaction: explaining.use.transaction })}
          body={words.explainBody}
          label={words.explainReason}
          act={words.explainAct}
          back={words.explainBack}
          onBack={() => setExplaining(null)}
          onAct={async (reason) => {
            await explain.mutateAsync({ useId: explaining.use.id, reason, key: explaining.key })
            setExplaining(null)
          }}
        />
      ) : null}
    </div>
  )
}

function Remarks({ use, onExplain }: { use: PermitUse; onExplain: (() => void) | undefined }) {
  if (use.voided) return <span className="t-note">{words.useVoided}</span>
  if (use.marks.length === 0) return <span className="t-note">{words.covered}</span>
  return (
    <div className="stack">
      <span>
        {use.marks.map((mark) => permitMarkNames[mark]).join(', ')}
        {use.excess > 0 ? `: ${words.excess({ excess: use.excess })}` : ''}
      </span>
      {use.explained ? (
        <span className="t-note">{words.explained(use.explained)}</span>
      ) : (
        <span className="row row-wrap">
          <Tag kind="solid">{words.toExplain({ count: 1 })}</Tag>
          {onExplain ? (
            <Button
              size="small"
              aria-label={words.explainQuestion({ transaction: use.transaction })}
              onClick={onExplain}
            >
              {words.explain}
            </Button>
          ) : null}
        </span>
      )}
    </div>
  )
}

function VoidPermit({ permit }: { permit: Permit }) {
  const [key, setKey] = useState<string | null>(null)
  const act = useVoidPermit(permit.number)
  return (
    <div>
      <Button onClick={() => setKey(newId())}>{words.void}</Button>
      {key !== null ? (
        <ReasonDialog
          question={words.voidQuestion({ number: permit.number })}
          body={words.voidBody}
          label={words.voidReason}
          act={words.voidAct}
          back={words.voidBack}
          onBack={() => setKey(null)}
          onAct={async (reason) => {
            await act.mutateAsync({ reason, key })
            setKey(null)
          }}
        />
      ) : null}
    </div>
  )
}
