import { useState } from 'react'
import type { WaterBody } from '../../../shared/contracts/enclosures.contract.ts'
import type { Isolation } from '../../../shared/contracts/water-facts.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useEndIsolation, useRecordIsolation, useRecordIsolationTest } from './mutations.ts'
import { StateDialog } from './state-dialog.tsx'

type Asked = { what: 'begin' } | { what: 'test' | 'end'; isolation: Isolation } | null

/** Isolations that stand, with their tests; where part of the joined water can be shut off for a treatment. */
export function IsolationRows({
  rows,
  bodies,
  mayRecord,
  sayWhen,
}: {
  rows: readonly Isolation[]
  bodies: readonly WaterBody[]
  mayRecord: boolean
  sayWhen: (at: string) => string
}) {
  const [asked, setAsked] = useState<Asked>(null)
  const back = () => setAsked(null)
  return (
    <>
      <ul className="state-rows">
        {rows.map((row) => (
          <li key={row.id} className="state-row">
            <span>
              <b>{waterWords.isolationOf({ codes: row.codes.join(', ') })}</b>
              <small>{waterWords.sinceBy({ at: sayWhen(row.happenedAt), by: row.recordedBy })}</small>
            </span>
            <span>{testWords(row, sayWhen)}</span>
            {mayRecord ? (
              <span className="row row-wrap">
                <Button size="small" onClick={() => setAsked({ what: 'test', isolation: row })}>
                  {waterWords.recordTest}
                </Button>
                <Button size="small" onClick={() => setAsked({ what: 'end', isolation: row })}>
                  {waterWords.endIsolation}
                </Button>
              </span>
            ) : (
              <span />
            )}
          </li>
        ))}
      </ul>
      {mayRecord && bodies.length > 1 ? (
        <Button size="small" onClick={() => setAsked({ what: 'begin' })}>
          {waterWords.recordIsolation}
        </Button>
      ) : null}
      {asked?.what === 'begin' ? <BeginDialog bodies={bodies} onBack={back} /> : null}
      {asked?.what === 'test' ? <TestDialog isolation={asked.isolation} onBack={back} /> : null}
      {asked?.what === 'end' ? <EndDialog isolation={asked.isolation} onBack={back} /> : null}
    </>
  )
}

function testWords({ test }: Isolation, sayWhen: (at: string) => string): string {
  if (!test) return waterWords.notTested
  const p = { method: test.method, at: sayWhen(test.at) }
  return test.passed ? waterWords.testPassed(p) : waterWords.testFailed(p)
}

function BeginDialog({ bodies, onBack }: { bodies: readonly WaterBody[]; onBack: () => void }) {
  const record = useRecordIsolation()
  const [chosen, setChosen] = useState<readonly string[]>([])
  return (
    <StateDialog
      question={waterWords.isolationQuestion}
      act={waterWords.record}
      shut={chosen.length === 0 ? waterWords.chooseBodyFirst : undefined}
      onBack={onBack}
      onRecord={(entry) => record.mutateAsync({ waterBodyIds: [...chosen], ...entry })}
    >
      <p className="t-2">{waterWords.isolationHint}</p>
      {bodies.map((body) => (
        <Tick
          key={body.id}
          label={`${body.code} ${body.name}`}
          checked={chosen.includes(body.id)}
          onChange={(event) =>
            setChosen(event.target.checked ? [...chosen, body.id] : chosen.filter((id) => id !== body.id))
          }
        />
      ))}
    </StateDialog>
  )
}

function TestDialog({ isolation, onBack }: { isolation: Isolation; onBack: () => void }) {
  const record = useRecordIsolationTest()
  const [method, setMethod] = useState('')
  const [found, setFound] = useState<'parted' | 'joined' | null>(null)
  return (
    <StateDialog
      question={waterWords.testQuestion({ codes: isolation.codes.join(', ') })}
      act={waterWords.record}
      shut={found === null ? waterWords.choosePartedFirst : undefined}
      withNote={false}
      onBack={onBack}
      onRecord={({ id, happenedAt }) =>
        record.mutateAsync({ isolationId: isolation.id, id, happenedAt, method, passed: found === 'parted' })
      }
    >
      <TextField
        label={waterWords.testMethod}
        hint={waterWords.testMethodHint}
        value={method}
        onChange={(event) => setMethod(event.target.value)}
      />
      <ChoiceField
        label={waterWords.partedLabel}
        segments={[
          { value: 'parted', label: waterWords.parted },
          { value: 'joined', label: waterWords.notParted },
        ]}
        value={found}
        onChange={setFound}
      />
    </StateDialog>
  )
}

function EndDialog({ isolation, onBack }: { isolation: Isolation; onBack: () => void }) {
  const end = useEndIsolation()
  return (
    <StateDialog
      question={waterWords.endQuestion({ codes: isolation.codes.join(', ') })}
      act={waterWords.record}
      onBack={onBack}
      onRecord={(entry) => end.mutateAsync({ isolationId: isolation.id, ...entry })}
    />
  )
}
