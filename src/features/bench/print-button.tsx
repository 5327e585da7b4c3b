import { Download } from 'lucide-react'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { printBenchSheet } from '../../../shared/contracts/bench-print.contract.ts'
import { benchPaper as words } from '../../../shared/messages/bench-paper.ts'
import { apiFile } from '../../lib/api-client.ts'
import { saveFile } from '../../lib/save-file.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { bodyOf } from './bench-draft.ts'
import type { Draft } from './bench-draft.ts'

const patienceMs = 30_000

/** Brings the sheet as PDF: the server works it out anew from the fields as they stand. */
export function PrintButton({ of, draft }: { of: AnyCalculator; draft: Draft }) {
  const refusal = useRefusal()
  const print = () =>
    refusal.attempt(async () => {
      const call = { params: { calculator: of.id }, body: bodyOf(of, draft), patienceMs }
      const { blob, name } = await apiFile(printBenchSheet, call)
      saveFile(blob, name ?? `${of.id}.pdf`)
    })
  const wrong = refusal.general([])
  return (
    <div className="stack gap-1">
      <span>
        {/* not disabled meanwhile: that would take the keys off it */}
        <Button
          icon={Download}
          aria-disabled={refusal.busy}
          onClick={refusal.busy ? undefined : () => void print()}
        >
          {refusal.busy ? words.printing : words.print}
        </Button>
      </span>
      {wrong ? <p role="alert">{wrong}</p> : null}
    </div>
  )
}
