import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import type { History } from '../../../../shared/contracts/exports.contract.ts'
import { historyWords, lifeStageNames, sexNames } from '../../../../shared/messages/history.ts'
import { historySheetWords as words } from '../../../../shared/messages/history-sheet.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { ExportPanel, HistoryFacts, historyQuery, HistoryView } from '../../../features/exports/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { TextField } from '../../../ui/text-field.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from './one-record.tsx'

/** The acquisition history of an animal or group, and its export. */
export function Component() {
  const { accession = '' } = useParams()
  useSheetTitle(historyWords.titled({ accession }))
  const list = useListState()
  const period = { from: list.get('since'), until: list.get('until') }
  const query = useQuery(historyQuery(accession, period))
  return (
    <OneRecord query={query} what={words.loading}>
      {(history, above) => (
        <Sheet recipe="history">
          <Area>
            <Cartouche
              place={
                <>
                  <Link to={paths.register()}>{registerWords.title}</Link> / {history.accession}
                </>
              }
              title={history.name ?? history.commonName}
              source={<About history={history} />}
            />
            <div className="pane stack gap-4">
              <HistoryFacts history={history} />
              <div className="pair">
                <TextField
                  label={registerWords.from}
                  type="date"
                  value={period.from ?? ''}
                  onChange={(event) => list.set({ since: event.target.value })}
                />
                <TextField
                  label={registerWords.until}
                  type="date"
                  value={period.until ?? ''}
                  onChange={(event) => list.set({ until: event.target.value })}
                />
              </div>
            </div>
          </Area>
          <Area className="pane">
            {above}
            <HistoryView history={history} />
          </Area>
          <Area ground="land">
            <ExportPanel history={history} period={period} />
          </Area>
        </Sheet>
      )}
    </OneRecord>
  )
}

function About({ history }: { history: History }) {
  const marks = history.identifiers.filter((mark) => mark.until === null).map((mark) => mark.value)
  return (
    <>
      {history.name === null ? '' : `${history.commonName}, `}
      <i className="sci">{history.scientificName}</i>
      {history.form === 'group'
        ? `, ${words.group}`
        : `, ${sexNames[history.sex]}, ${lifeStageNames[history.lifeStage]}`}
      {marks.length > 0 ? `. ${marks.join(', ')}` : ''}
    </>
  )
}
