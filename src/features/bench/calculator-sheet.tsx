import { useCallback, useDeferredValue, useMemo, useRef, useState } from 'react'
import { Link, useLocation } from 'react-router-dom'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { say, sayRefusal } from '../../../shared/bench/words.ts'
import { benchSheetWords as words } from '../../../shared/messages/bench-sheet.ts'
import { paths } from '../../lib/paths.ts'
import { quantityTools } from '../../lib/quantity-tools.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { QuantityToolsContext } from '../../ui/quantity-context.ts'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { bodyOf, draftLeft, emptyDraft, enclosureLeft, exampleDraft, isUntouched } from './bench-draft.ts'
import type { Draft } from './bench-draft.ts'
import { CarryPane } from './carry-pane.tsx'
import { EnclosureField } from './enclosure-field.tsx'
import { InputFields } from './input-fields.tsx'
import { BenchPlot } from './plot.tsx'
import { PrintButton } from './print-button.tsx'
import { rememberedUnits } from './remembered-units.ts'
import { ResultBar } from './result-bar.tsx'
import { ResultSaid } from './result-said.tsx'
import { ResultFigures, ResultGrounds } from './result.tsx'
import { useEnclosureWater } from './use-enclosure-water.ts'

/** Elsewhere a bare gallon is that of the facility; a figure of the bench may go to anybody, and is asked which it is. */
const benchTools = quantityTools()

/** One calculator: its fields, and the figure as one types, by the same code that the server answers with. */
export function CalculatorSheet({ of }: { of: AnyCalculator }) {
  const { state } = useLocation()
  const [draft, setDraft] = useState(() => draftLeft(of, state) ?? emptyDraft(of, rememberedUnits()))
  const body = useMemo(() => bodyOf(of, draft), [of, draft])
  const evaluation = useMemo(() => evaluate(of, body), [of, body])
  // the curve asks the calculator dozens of times: it follows once the figure stands
  const drawnBody = useDeferredValue(body)
  const water = useEnclosureWater(of, setDraft, enclosureLeft(state))
  const result = useRef<HTMLElement>(null)
  const [asking, setAsking] = useState<readonly string[]>([])
  const onAsking = useCallback((label: string, open: boolean) => {
    setAsking((labels) => [...labels.filter((each) => each !== label), ...(open ? [label] : [])])
  }, [])
  const untouched = isUntouched(draft)
  const startAgain = (next: Draft) => {
    water.forget()
    setDraft(next)
  }
  const filled = (name: string) => {
    const given = draft[name]
    return typeof given === 'object' ? given.value.trim() !== '' : given !== undefined && given !== ''
  }
  const refusals = evaluation.ok ? [] : evaluation.refusals
  const wrong = (name: string) => {
    // an empty field is no fault of the person's yet: it is asked for where the figure will stand
    const refusal = refusals.find((one) => one.field === name)
    return refusal && filled(name) ? sayRefusal(of, refusal) : undefined
  }
  return (
    <QuantityToolsContext value={benchTools}>
      <Sheet recipe="order" className="bench-sheet">
        <Area>
          <Cartouche
            place={<Link to={paths.bench()}>{words.title}</Link>}
            title={say(of, 'name')}
            source={say(of, 'purpose')}
          />
          <div className="pane stack">
            <p className="t-2">{words.decisionSupport}</p>
            <div className="row row-wrap">
              <Button size="small" onClick={() => startAgain(exampleDraft(of))}>
                {words.example}
              </Button>
              <Button size="small" kind="plain" onClick={() => startAgain(emptyDraft(of, rememberedUnits()))}>
                {words.clear}
              </Button>
            </div>
          </div>
        </Area>
        <Area className="pane stack">
          <EnclosureField of={of} water={water} />
          <InputFields
            of={of}
            draft={draft}
            onChange={setDraft}
            wrong={wrong}
            noteOf={(name) => water.note(name, draft[name])}
            onAsking={onAsking}
          />
          {untouched ? null : <ResultBar of={of} evaluation={evaluation} result={result} />}
        </Area>
        <Area className="bench-result">
          <ResultSaid of={of} evaluation={evaluation} untouched={untouched} />
          <section ref={result} tabIndex={-1} className="net-volume" aria-label={words.result}>
            <h2 className="t-label">{words.result}</h2>
            {asking.map((field) => (
              <p key={field} className="t-strong">
                {words.unitOpen({ field })}
              </p>
            ))}
            {evaluation.ok ? (
              <ResultFigures of={of} answer={evaluation.answer} />
            ) : (
              <>
                <p className="sea-name">{words.notYet}</p>
                {untouched ? (
                  <p>{words.startHere}</p>
                ) : (
                  <ul className="bench-asked">
                    {refusals.map((one) => (
                      <li key={`${one.field ?? ''} ${one.code}`}>{sayRefusal(of, one)}</li>
                    ))}
                  </ul>
                )}
              </>
            )}
          </section>
          {evaluation.ok ? (
            <div className="pane stack">
              <ResultGrounds of={of} answer={evaluation.answer}>
                <BenchPlot of={of} body={drawnBody} />
              </ResultGrounds>
              <PrintButton of={of} draft={draft} />
              <CarryPane of={of} draft={draft} answer={evaluation.answer} water={water} />
            </div>
          ) : null}
        </Area>
      </Sheet>
    </QuantityToolsContext>
  )
}
