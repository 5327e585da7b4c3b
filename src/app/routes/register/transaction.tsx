import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import type { Transaction } from '../../../../shared/contracts/acquisitions.contract.ts'
import { transactionKindNames } from '../../../../shared/messages/register-kinds.ts'
import { registerWords, transactionWords as words } from '../../../../shared/messages/register-sheet.ts'
import { sayInstant } from '../../../../shared/messages/say-date.ts'
import { TransactionFacts, transactionQuery, TransactionView } from '../../../features/acquisitions/index.ts'
import { useMe } from '../../../lib/me.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from './one-record.tsx'

/** One transaction. */
export function Component() {
  const { number = '' } = useParams()
  useSheetTitle(number)
  const query = useQuery(transactionQuery(number))
  return (
    <OneRecord query={query} what={number}>
      {(transaction, above) => (
        <Sheet recipe="list">
          <Area>
            <Head transaction={transaction} />
          </Area>
          <Area className="pane">
            {above}
            <TransactionView transaction={transaction} />
          </Area>
        </Sheet>
      )}
    </OneRecord>
  )
}

function Head({ transaction: t }: { transaction: Transaction }) {
  const { zone } = useMe().facility
  const { voided } = t
  return (
    <>
      <Cartouche
        place={
          <>
            <Link to={paths.register()}>{registerWords.title}</Link> / {t.number}
          </>
        }
        title={transactionKindNames[t.kind]}
        source={words.source({ at: sayInstant(t.recordedAt, zone), by: t.recordedBy })}
      />
      {voided ? (
        <p className="notice">{words.voided({ ...voided, at: sayInstant(voided.at, zone) })}</p>
      ) : null}
      <div className="pane">
        <TransactionFacts transaction={t} />
      </div>
    </>
  )
}
