import { Printer } from 'lucide-react'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { useMay } from '../../lib/may.ts'
import { buttonClass, ButtonFace } from '../../ui/button.tsx'
import { sheetPrintAddress } from './queries.ts'

/** The bath sheet as a file, for whoever may print orders. */
export function PrintLink({ number, doseKey }: { number: string; doseKey: string }) {
  const print = useMay('order.print')
  if (!print.allowed) return null
  return (
    <a
      className={buttonClass({})}
      href={sheetPrintAddress(number, doseKey)}
      download={`${number}-dose-${doseKey}.pdf`}
    >
      <ButtonFace icon={Printer}>{words.print}</ButtonFace>
    </a>
  )
}
