import { useSearchParams } from 'react-router-dom'
import { orderFormWords } from '../../../../shared/messages/order-form.ts'
import { weightFormWords as words } from '../../../../shared/messages/weight-form.ts'
import { WeightForm } from '../../../features/orders/index.ts'
import { useMay } from '../../../lib/may.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { MayNotWrite } from './may-not-write.tsx'

/** What a dose by the weight of an animal would be. */
export function Component() {
  useSheetTitle(words.title)
  const may = useMay('order.draft')
  const [search] = useSearchParams()
  if (!may.allowed) return <MayNotWrite why={may.why ?? orderFormWords.mayNotWrite} />
  return <WeightForm animalId={search.get('animal')} />
}
