import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import { agentNames } from '../../../../shared/messages/formulary.ts'
import { formularyWords as words } from '../../../../shared/messages/formulary-screens.ts'
import {
  ConfirmLine,
  DoseLineFacts,
  formularyQuery,
  Products,
  useOfLine,
} from '../../../features/formulary/index.ts'
import { useMe } from '../../../lib/me.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'

/** One dose line: its range, where it comes from, who confirmed it, and the products it applies to. */
export function Component() {
  const { id = '' } = useParams()
  const { zone } = useMe().facility
  const query = useQuery(formularyQuery)
  const line = query.data?.lines.find((one) => one.id === id)
  useSheetTitle(line ? agentNames[line.agent] : words.lineTitle)
  return (
    <OneRecord query={query} what={words.lineTitle}>
      {({ products }, above) => (
        <Sheet recipe="list">
          <Area>
            <Cartouche
              place={
                <>
                  {words.place}
                  {' / '}
                  <Link to={paths.formulary()}>{words.title}</Link>
                </>
              }
              title={line ? agentNames[line.agent] : words.lineTitle}
              source={line ? useOfLine(line) : undefined}
            />
            {line ? (
              <div className="pane">
                <ConfirmLine line={line} />
              </div>
            ) : null}
          </Area>
          <Area className="pane stack gap-6">
            {above}
            {line ? <DoseLineFacts line={line} zone={zone} /> : <p>{words.gone}</p>}
            {line ? (
              <section className="stack">
                <h2 className="t-head">{words.productsOfDrug}</h2>
                {products.some((one) => one.agent === line.agent) ? (
                  <Products products={products.filter((one) => one.agent === line.agent)} zone={zone} />
                ) : (
                  <p className="t-2">{words.noneOfDrug}</p>
                )}
              </section>
            ) : null}
          </Area>
        </Sheet>
      )}
    </OneRecord>
  )
}
