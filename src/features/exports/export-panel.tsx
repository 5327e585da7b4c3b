import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Download } from 'lucide-react'
import type { History } from '../../../shared/contracts/exports.contract.ts'
import type { ExportFormat } from '../../../shared/domain/register/export-formats.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { historySheetWords as words } from '../../../shared/messages/history-sheet.ts'
import { exportFormatNames } from '../../../shared/messages/register-kinds.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useExportHistory } from './mutations.ts'
import type { PeriodGiven } from './queries.ts'
import { exportAddress, exportsQuery } from './queries.ts'
import { saveFile } from './save-file.ts'

const formats = ['pdf', 'csv', 'json', 'darwin-core'] as const
type Shown = (typeof formats)[number]

const whatYouGet: Record<Shown, (entries: number) => string> = {
  pdf: (entries) => words.whatPdf({ entries }),
  csv: (entries) => words.whatCsv({ entries }),
  json: () => words.whatJson,
  'darwin-core': (entries) => words.whatDarwin({ entries }),
}

/** Beside the history: the form in which it leaves the house, for what, and what left before. */
export function ExportPanel({ history, period }: { history: History; period: PeriodGiven }) {
  const may = useMay('history.export')
  const { zone } = useMe().facility
  const [shown, setShown] = useState<Shown>('pdf')
  const [guarded, setGuarded] = useState(false)
  const [reason, setReason] = useState('')
  const make = useExportHistory(history.accession)
  const say = useToast()
  const earlier = useQuery({
    ...exportsQuery({ animalId: history.animalId, limit: 5 }),
    enabled: may.allowed,
  })
  const format: ExportFormat = shown === 'csv' && guarded ? 'csv-guarded' : shown

  const send = () =>
    make.mutate(
      { id: newId(), format, reason: reason.trim() || null, ...period },
      {
        onSuccess: (made) => {
          saveFile(exportAddress(made.id), made.fileName)
          say({ words: words.made({ name: made.fileName }) })
        },
      },
    )

  return (
    <div className="pane stack">
      <h2 className="t-head">{words.export}</h2>
      <WrongSummary fields={[]} general={isProblem(make.error) ? make.error.says : undefined} />
      <ChoiceField
        label={words.format}
        segments={formats.map((value) => ({ value, label: exportFormatNames[value] }))}
        value={shown}
        onChange={setShown}
      />
      {shown === 'csv' ? (
        <Tick
          label={words.forSpreadsheets}
          hint={words.forSpreadsheetsHint}
          checked={guarded}
          onChange={(event) => setGuarded(event.target.checked)}
        />
      ) : null}
      <TextField
        label={words.reason}
        hint={words.reasonHint}
        optional
        value={reason}
        maxLength={500}
        onChange={(event) => setReason(event.target.value)}
      />
      <div className="export-preview">
        <p className="t-sub">{words.what}</p>
        <p>{whatYouGet[shown](history.events.length)}</p>
      </div>
      <Button
        kind="primary"
        icon={Download}
        block
        shut={may.allowed ? make.isPending && formWords.sending : may.why}
        onClick={send}
      >
        {words.act}
      </Button>
      <p className="hint">{words.recorded}</p>
      {may.allowed && earlier.data ? (
        <section className="stack">
          <h3 className="t-label">{words.earlier}</h3>
          {earlier.data.rows.length === 0 ? <p className="t-note">{words.noneEarlier}</p> : null}
          <ul className="stack">
            {earlier.data.rows.map((row) => (
              <li key={row.id}>
                <a href={exportAddress(row.id)} download={row.fileName}>
                  {row.fileName}
                </a>
                <span className="t-note block">
                  {words.earlierLine({ at: sayInstant(row.exportedAt, zone), by: row.exportedBy })}
                </span>
              </li>
            ))}
          </ul>
        </section>
      ) : null}
    </div>
  )
}
