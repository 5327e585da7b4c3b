import { useState } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { registerWords, transactionFormWords as words } from '../../../../shared/messages/register-sheet.ts'
import { PapersLeft, TransactionForm } from '../../../features/acquisitions/index.ts'
import type { Recorded } from '../../../features/acquisitions/index.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** The form by which animals come or go; when all papers are attached it leads to the transaction. */
export function NewTransaction({ way }: { way: 'in' | 'out' }) {
  const title = way === 'in' ? words.acquisition : words.disposition
  useSheetTitle(title)
  const navigate = useNavigate()
  const [unfinished, setUnfinished] = useState<Recorded | null>(null)
  const leave = (number: string) => void navigate(paths.transaction(number))
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={<Link to={paths.register()}>{registerWords.title}</Link>}
          title={title}
          source={way === 'in' ? words.acquisitionSource : words.dispositionSource}
        />
      </Area>
      <Area className="pane">
        {unfinished ? (
          <PapersLeft recorded={unfinished} onDone={leave} />
        ) : (
          <TransactionForm
            way={way}
            onRecorded={(recorded) =>
              recorded.left.length > 0 ? setUnfinished(recorded) : leave(recorded.transaction.number)
            }
          />
        )}
      </Area>
    </Sheet>
  )
}
