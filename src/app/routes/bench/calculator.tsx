import { Link, useParams } from 'react-router-dom'
import { calculatorAt } from '../../../../shared/bench/calculators.ts'
import { say } from '../../../../shared/bench/words.ts'
import { benchSheetWords as words } from '../../../../shared/messages/bench-sheet.ts'
import { CalculatorSheet } from '../../../features/bench/index.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** One calculator. */
export function Component() {
  const { calculator = '' } = useParams()
  const of = calculatorAt(calculator)
  useSheetTitle(of ? say(of, 'name') : words.title)
  if (of) return <CalculatorSheet key={of.id} of={of} />
  return (
    <Sheet>
      <Area>
        <Cartouche title={words.title} source={words.missing} />
        <p className="pane">
          <Link to={paths.bench()}>{words.back}</Link>
        </p>
      </Area>
    </Sheet>
  )
}
