import { Link, useLoaderData } from 'react-router-dom'
import type { LoaderFunctionArgs } from 'react-router-dom'
import type { AnyCalculator } from '../../../../shared/bench/definition.ts'
import { say } from '../../../../shared/bench/words.ts'
import { benchSheetWords as words } from '../../../../shared/messages/bench-sheet.ts'
import { CalculatorSheet, loadCalculator } from '../../../features/bench/index.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** Brings the calculator of the address before its sheet is drawn; null where there is none. */
export async function loader({ params }: LoaderFunctionArgs): Promise<AnyCalculator | null> {
  return (await loadCalculator(params.calculator ?? '')) ?? null
}

/** One calculator. */
export function Component() {
  const of = useLoaderData<AnyCalculator | null>()
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
