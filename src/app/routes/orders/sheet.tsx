import { useParams, useSearchParams } from 'react-router-dom'
import { sheetWords } from '../../../../shared/messages/doses-screens.ts'
import { BathSheet, DoseOfNow } from '../../../features/doses/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** The bath sheet at the tank: one planned dose of an order, by its key in the address. */
export function Component() {
  const { number = '' } = useParams()
  const [search] = useSearchParams()
  const key = search.get('dose')
  const part = search.get('part')
  useSheetTitle(key === null ? sheetWords.sheetOf({ number }) : sheetWords.tab({ number, key }))
  if (key === null) return <DoseOfNow number={number} />
  return (
    <BathSheet
      key={`${number} ${key}`}
      number={number}
      doseKey={key}
      part={part === 'second' || part === 'whole' ? part : null}
    />
  )
}
