import { useState, useSyncExternalStore } from 'react'
import { useQuery } from '@tanstack/react-query'
import { useLocation, useNavigate } from 'react-router-dom'
import type { AnyCalculator, Carry } from '../../../shared/bench/definition.ts'
import type { BenchAnswer } from '../../../shared/bench/evaluate.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import { benchCarryWords as words } from '../../../shared/messages/bench-carry.ts'
import { parameterNames } from '../../../shared/messages/water.ts'
import { carryState } from '../../lib/bench-carry.ts'
import { mayOf } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { EnclosureChooser, everyEnclosure } from '../enclosures/index.ts'
import { bodyOf, keptDraft } from './bench-draft.ts'
import type { Draft } from './bench-draft.ts'
import { carriedOf } from './carried.ts'
import type { Asked } from './carried.ts'
import type { EnclosureWater } from './use-enclosure-water.ts'

/** The right that the form at the other end asks for. */
const rights = {
  order: 'order.draft',
  volume: 'water.configure',
  reading: 'water.record',
} as const satisfies Record<Carry['to'], Action>

const labelOf = (carry: Carry): string => {
  if (carry.to === 'order') return words.toOrder
  return carry.to === 'volume'
    ? words.toVolume
    : words.toReading({ parameter: parameterNames[carry.parameter] })
}

function onNetworkChange(changed: () => void): () => void {
  for (const event of ['online', 'offline']) window.addEventListener(event, changed)
  return () => {
    for (const event of ['online', 'offline']) window.removeEventListener(event, changed)
  }
}

/**
 * Takes a result into the form of an order, a volume or a reading. Going back finds the bench as it was left.
 */
export function CarryPane({
  of,
  draft,
  answer,
  water,
}: {
  of: AnyCalculator
  draft: Draft
  answer: BenchAnswer
  water: EnclosureWater
}) {
  const me = useMe()
  const navigate = useNavigate()
  const { pathname } = useLocation()
  const { data } = useQuery(everyEnclosure)
  const [ownId, setOwnId] = useState<string | null>(null)
  const online = useSyncExternalStore(onNetworkChange, () => navigator.onLine)
  const [tried, setTried] = useState(false)
  const chosenId = water.id
  const asked: Asked = {
    body: bodyOf(of, draft),
    answer,
    originOf: (name) => water.originOf(name, draft[name]),
  }
  const carries = (of.carries ?? []).filter((carry) => carriedOf(of, carry, asked, null) !== null)
  if (carries.length === 0) return null
  const enclosureId = chosenId ?? ownId
  const code = data?.rows.find((row) => row.id === enclosureId)?.code
  const needsPlace = carries.some(({ to }) => to !== 'order' && mayOf(me, rights[to]).allowed)

  const take = async (carry: Carry) => {
    const carried = carriedOf(of, carry, asked, enclosureId)
    if (!carried) return
    // the form lives on the server: going there now would leave a sheet that still works for one that cannot come
    setTried(!navigator.onLine)
    if (!navigator.onLine) return
    const form =
      carry.to === 'order'
        ? paths.newOrder()
        : carry.to === 'volume'
          ? paths.enclosureVolume(code ?? '')
          : paths.enclosureMeasure(code ?? '')
    await navigate(pathname, { replace: true, state: keptDraft(draft, chosenId) })
    await navigate(form, { state: carryState(carried) })
  }

  return (
    <section className="stack bench-further" aria-label={words.further}>
      <h2 className="t-head">{words.further}</h2>
      {needsPlace && chosenId === null ? (
        <EnclosureChooser label={words.whichEnclosure} value={ownId} onChange={setOwnId} />
      ) : null}
      <div className="row row-wrap">
        {carries.map((carry) => {
          const may = mayOf(me, rights[carry.to])
          const shut = may.allowed
            ? carry.to !== 'order' && code === undefined && words.chooseEnclosure
            : (may.why ?? '')
          return (
            <Button key={labelOf(carry)} shut={shut} onClick={() => void take(carry)}>
              {labelOf(carry)}
            </Button>
          )
        })}
      </div>
      {tried && !online ? <p role="alert">{words.noNetwork}</p> : null}
      <p className="t-note">{words.nothingSaved}</p>
    </section>
  )
}
