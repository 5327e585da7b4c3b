import { ok, refuse, type Result } from '../../../domain/result.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { dripRate, dripTotal, primingVolume } from '../../../domain/water/flow/drip-rate.ts'
import { minutesToFraction } from '../../../domain/water/flow/wash-out.ts'
import { wellMixedConcentration } from '../../../domain/water/flow/well-mixed-concentration.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchLine, Figure, Outcome, Schedule } from '../../definition.ts'
import { line } from '../../line.ts'
import { formalinCautions } from './formalin-cautions.ts'

const perThousand = 1000
/** A bath counts as reached when only this share of it is missing. */
const missingShare = 0.05
const turnoverSteps = [0, 0.5, 1, 1.5, 2, 3, 4, 5] as const

interface Drip {
  flow: ParsedQuantity
  /** Target and stock are both by weight or both by volume. */
  target: ParsedQuantity
  /** What both are of. */
  basis: string
  stock: ParsedQuantity
  volume: ParsedQuantity | undefined
  duration: ParsedQuantity | undefined
  unit: 'mg/L' | 'uL/L'
}

/** The drip of a stock into a flow, with what primes the tank and what the whole time takes. */
export function dripAnswer({ flow, target, basis, stock, volume, duration, unit }: Drip): Result<Outcome> {
  // a litre of undiluted product in a litre is a million microlitres, as a kilogram is a million milligrams
  const asked = { targetMgPerL: target.value, stockMgPerMl: stock.value / perThousand }
  const [water, wanted, strength] = [enteredTerm(flow), enteredTerm(target), enteredTerm(stock)]
  const drip = dripRate({ ...asked, inflowLPerMin: flow.value })
  if (!drip.ok) return drip
  const figures: [Figure, ...Figure[]] = [{ key: 'drip', value: drip.value, unit: 'mL/min', kind: 'dose' }]
  const working = [
    line('drip', `${water} * ${wanted} / (${strength} - ${wanted}) to mL/minute`, drip.value, 'mL/min'),
  ]
  let primingMl = 0
  let schedule: Schedule | undefined
  if (volume) {
    const prime = primingVolume({ ...asked, volumeLitres: volume.value })
    if (!prime.ok) return prime
    primingMl = prime.value
    const through = { flowLPerMin: flow.value, volumeLitres: volume.value }
    const reach = minutesToFraction({ ...through, fraction: missingShare })
    if (!reach.ok) return reach
    const rows = unprimed(through, target.value)
    if (!rows.ok) return rows
    schedule = { columns: columnsIn(unit), rows: rows.value }
    const tank = enteredTerm(volume)
    figures.push({ key: 'prime', value: primingMl, unit: 'mL', kind: 'dose' })
    figures.push({ key: 'reach', value: reach.value, unit: 'min', figures: 3 })
    working.push(line('prime', `${wanted} * ${tank} / (${strength}) to mL`, primingMl, 'mL'))
    working.push(
      line('reach', `-log(${String(missingShare)}) * ${tank} / (${water}) to minute`, reach.value, 'min'),
    )
  }
  if (duration) {
    const total = dripTotal({
      dripMlPerMin: drip.value,
      minutes: duration.value,
      primingMl,
      stockMgPerMl: asked.stockMgPerMl,
    })
    if (!total.ok) return total
    const used = usedOver(drip.value, duration, primingMl, strength, total.value, unit)
    figures.push(...used.figures)
    working.push(...used.lines)
  }
  const byVolume = formalinCautions({ target, basis, form: 'liquid', strength: stock, strengthOf: basis })
  return ok({
    figures,
    working,
    ...(schedule ? { schedule } : {}),
    cautions: [{ code: volume ? 'prime-whole' : 'not-primed', level: 'warning' }, ...byVolume.cautions],
    sources: byVolume.sources,
  })
}

function usedOver(
  dripMlPerMin: number,
  duration: ParsedQuantity,
  primingMl: number,
  strength: string,
  total: { stockMl: number; drugMg: number },
  unit: 'mg/L' | 'uL/L',
): { figures: Figure[]; lines: BenchLine[] } {
  const primed = primingMl > 0 ? ` + ${valueTerm(primingMl, 'mL')}` : ''
  const dripped = `${valueTerm(dripMlPerMin, 'mL/min')} * ${enteredTerm(duration)}`
  const rests = primed === '' ? ['drip'] : ['drip', 'prime']
  // by volume a milligram stands for a microlitre
  const drug =
    unit === 'mg/L'
      ? ({ value: total.drugMg / perThousand, unit: 'g' } as const)
      : ({ value: total.drugMg / perThousand, unit: 'mL' } as const)
  return {
    figures: [
      { key: 'stock-used', value: total.stockMl, unit: 'mL', kind: 'dose' },
      { key: 'drug-used', ...drug, kind: 'dose' },
    ],
    lines: [
      line('stock-used', `${dripped}${primed} to mL`, total.stockMl, 'mL', rests),
      line(
        'drug-used',
        `${valueTerm(total.stockMl, 'mL')} * ${strength} to ${drug.unit}`,
        drug.value,
        drug.unit,
        ['stock-used'],
      ),
    ],
  }
}

const columnsIn = (unit: 'mg/L' | 'uL/L'): Schedule['columns'] => [
  { key: 'turnovers', unit: 'ratio', figures: 2 },
  { key: 'minutes', unit: 'min', figures: 3 },
  { key: 'unprimed', unit, figures: 3 },
]

/** How the concentration of a tank that is not primed climbs, turnover by turnover. */
function unprimed(
  through: { flowLPerMin: number; volumeLitres: number },
  targetMgPerL: number,
): Result<number[][]> {
  const rows: number[][] = []
  for (const turnovers of turnoverSteps) {
    const minutes = (turnovers * through.volumeLitres) / through.flowLPerMin
    const reached = wellMixedConcentration({
      ...through,
      initialMgPerL: 0,
      inflowMgPerL: targetMgPerL,
      lossPerMin: 0,
      minutes,
    })
    // turnovers of centuries are no flow
    if (!reached.ok) return refuse('not-finite', 'flow')
    rows.push([turnovers, minutes, reached.value])
  }
  return ok(rows)
}
