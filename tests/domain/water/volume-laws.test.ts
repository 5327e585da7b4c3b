import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { UnitOf } from '../../../shared/domain/units/unit-table.ts'
import { circleSegmentArea } from '../../../shared/domain/water/circle-segment-area.ts'
import { combineErrors } from '../../../shared/domain/water/combine-errors.ts'
import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import { computeTurnover } from '../../../shared/domain/water/compute-turnover.ts'
import { flowForTurnover } from '../../../shared/domain/water/flow-for-turnover.ts'
import { remainingAfterChanges } from '../../../shared/domain/water/remaining-after-changes.ts'
import type { TankShape } from '../../../shared/domain/water/tank-shape.ts'
import { volumeOfShape } from '../../../shared/domain/water/volume-of-shape.ts'
import { waterChangeShare } from '../../../shared/domain/water/water-change-share.ts'

/** Lengths as a person types them: whole millimetres from 1 cm to 3 m. */
const millimetres = fc.integer({ min: 10, max: 3000 })
const m = (mm: number): Quantity => quantityOf(mm / 1000, 'm')

const shapes = {
  rectangular: fc.record({ length: millimetres, width: millimetres }),
  cylindrical: fc.record({ diameter: millimetres }),
  'half-cylindrical': fc.record({ diameter: millimetres }),
  'cone-bottom': fc.record({ diameter: millimetres, coneHeight: millimetres }),
  'truncated-cone': fc.record({ topDiameter: millimetres, bottomDiameter: millimetres }),
  'spherical-cap': fc.record({ radius: millimetres }),
  'horizontal-cylinder': fc.record({ diameter: millimetres, length: millimetres }),
}

type Built = { tank: TankShape; scaled: (factor: number) => TankShape; deepest: number; depth: number }

/** Any shape with a depth that it can have, as a function of one factor on all its lengths. */
const built: fc.Arbitrary<Built> = fc
  .constantFrom(...(Object.keys(shapes) as (keyof typeof shapes)[]))
  .chain((shape) =>
    fc.record({ shape: fc.constant(shape), lengths: shapes[shape], part: fc.integer({ min: 1, max: 100 }) }),
  )
  .map(({ shape, lengths, part }) => {
    const named = lengths as Record<string, number>
    const deepest =
      shape === 'spherical-cap'
        ? 2 * (named.radius ?? 0)
        : shape === 'horizontal-cylinder'
          ? (named.diameter ?? 0)
          : 3000
    const depth = Math.max(1, Math.floor((deepest * part) / 100))
    const scaled = (factor: number) =>
      ({
        shape,
        ...Object.fromEntries(Object.entries(named).map(([name, mm]) => [name, m(mm * factor)])),
        depth: m(depth * factor),
      }) as TankShape
    return { tank: scaled(1), scaled, deepest, depth }
  })

function litres(tank: TankShape): number {
  const result = volumeOfShape(tank)
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value.litres
}

function close(a: number, b: number, relative = 1e-9): void {
  expect(Math.abs(a - b)).toBeLessThanOrEqual(relative * Math.max(Math.abs(a), Math.abs(b)))
}

describe('laws of volumes', () => {
  it('eight times the water in twice the size', () => {
    fc.assert(fc.property(built, ({ tank, scaled }) => close(litres(scaled(2)), 8 * litres(tank))))
  })

  it('more water in a deeper tank, and none of it negative', () => {
    fc.assert(
      fc.property(built, ({ tank, depth, deepest }) => {
        fc.pre(depth + 1 <= deepest)
        const deeper = { ...tank, depth: m(depth + 1) } as TankShape
        expect(litres(tank)).toBeGreaterThan(0)
        expect(litres(deeper)).toBeGreaterThan(litres(tank))
      }),
    )
  })

  it('the same water whatever unit the tape is in', () => {
    const lengthUnits: UnitOf<'length'>[] = ['mm', 'cm', 'in', 'ft']
    fc.assert(
      fc.property(built, fc.constantFrom(...lengthUnits), ({ tank }, unit) => {
        const inOther = Object.fromEntries(
          Object.entries(tank).map(([name, value]) => {
            if (name === 'shape') return [name, value]
            const converted = convert(Number((value as Quantity).value), 'm', unit)
            return [name, converted.ok ? { value: converted.value.toFixed(12), unit } : value]
          }),
        ) as TankShape
        const other = volumeOfShape(inOther)
        close(litres(tank), other.ok ? other.value.litres : NaN, 1e-7)
      }),
    )
  })

  it('every line of every shape is borne out by the second evaluation', async () => {
    await fc.assert(
      fc.asyncProperty(built, async ({ tank }) => {
        const result = volumeOfShape(tank)
        expect(await verifyWorking(result.ok ? result.value.lines : [])).toEqual({ ok: true })
      }),
      { numRuns: 300 },
    )
  })

  it('a lying cylinder full to the top is borne out, whatever units its diameter and its depth are in', async () => {
    const inchesIn = { in: 1, cm: 2.54, mm: 25.4, m: 0.0254, ft: 1 / 12 }
    const forms = Object.entries(inchesIn) as [UnitOf<'length'>, number][]
    for (const inches of [0.5, 3, 7.1, 10, 23.5, 37, 48.5, 60, 96.3, 120])
      for (const [unit, factor] of forms)
        for (const [depthUnit, depthFactor] of forms) {
          const result = volumeOfShape({
            shape: 'horizontal-cylinder',
            diameter: quantityOf(Number((inches * factor).toPrecision(14)), unit),
            length: m(1000),
            depth: quantityOf(Number((inches * depthFactor).toPrecision(14)), depthUnit),
          })
          if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
          close(result.value.litres, (Math.PI / 4) * (inches * 0.0254) ** 2 * 1000, 1e-12)
          expect(await verifyWorking(result.value.lines)).toEqual({ ok: true })
        }
  })

  it('the whole worksheet conserves water: net + displaced = gross = the sum of the parts', async () => {
    const errorPercent = fc.integer({ min: 0, max: 30 })
    await fc.assert(
      fc.asyncProperty(
        fc.array(fc.tuple(built, errorPercent), { minLength: 1, maxLength: 4 }),
        fc.integer({ min: 0, max: 95 }),
        errorPercent,
        async (parts, share, shareError) => {
          const sheet = {
            method: 'geometry' as const,
            parts: parts.map(([{ tank }, error], index) => ({
              key: `part-${index}`,
              role: index === 0 ? ('tank' as const) : ('sump' as const),
              shape: tank,
              errorPercent: error,
            })),
            pipes: [{ key: 'pipes', bore: m(57), length: m(14200), errorPercent: 10 }],
            displacement: {
              by: 'share' as const,
              share: quantityOf(share, 'percent'),
              errorPercent: shareError,
            },
          }
          const result = computeVolume(sheet)
          // errors that add up to more than the water itself are refused: no sheet to conserve anything
          fc.pre(result.ok || result.refusal.code !== 'error-above-volume')
          if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
          const {
            grossLitres,
            displacedLitres,
            netLitres,
            errorLitres,
            errorPercent: relative,
            working,
          } = result.value
          close(netLitres + displacedLitres, grossLitres)
          const sum = working
            .filter((line) => /^(part-\d|pipes)$/.test(line.key))
            .reduce((all, line) => all + line.value, 0)
          close(sum, grossLitres)
          close((netLitres * relative) / 100, errorLitres)
          expect(await verifyWorking(working)).toEqual({ ok: true })
        },
      ),
      { numRuns: 100 },
    )
  })

  it('a combined error is no smaller than its largest part and no larger than their sum', () => {
    const part = fc.record({
      key: fc.string(),
      litres: fc.double({ min: 0.01, max: 1e6, noNaN: true }),
      errorPercent: fc.oneof(fc.constant(0), fc.double({ min: 0.001, max: 100, noNaN: true })),
    })
    fc.assert(
      fc.property(fc.array(part, { minLength: 1, maxLength: 6 }), (parts) => {
        const each = parts.map((one) => (one.litres * one.errorPercent) / 100)
        const { errorLitres } = combineErrors(parts, 1000)
        expect(errorLitres).toBeGreaterThanOrEqual(Math.max(...each) * (1 - 1e-12))
        expect(errorLitres).toBeLessThanOrEqual(each.reduce((sum, one) => sum + one, 0) * (1 + 1e-12))
      }),
    )
  })

  it('a segment and its complement make the circle, thin or thick', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 75, noNaN: true }),
        fc.constantFrom(0, 1e-5, 0.001, 0.1, 0.3, 0.5, 0.7, 0.999, 1),
        (radius, part) => {
          const height = 2 * radius * part
          const both = circleSegmentArea(radius, height) + circleSegmentArea(radius, 2 * radius - height)
          close(both, Math.PI * radius ** 2)
        },
      ),
    )
    // A thin segment of height h is 4/3 × h × √(2Rh), to first order: the arccosine form loses these digits
    close(circleSegmentArea(75, 0.001), (4 / 3) * 0.001 * Math.sqrt(2 * 75 * 0.001), 1e-5)
  })
})

describe('laws of turnover and change', () => {
  const flows = fc.integer({ min: 1, max: 100_000 })

  it('turnover time × turnovers a day is a day, and the flow for it is the flow', async () => {
    await fc.assert(
      fc.asyncProperty(flows, flows, async (volume, flow) => {
        const turnover = computeTurnover({ volume: quantityOf(volume, 'L'), flow: quantityOf(flow, 'L/min') })
        if (!turnover.ok) throw new Error(turnover.refusal.code)
        const { minutes, perDay, working } = turnover.value
        close(minutes * perDay, 1440)
        const back = flowForTurnover({
          volume: quantityOf(volume, 'L'),
          turnover: quantityOf(minutes, 'min'),
        })
        if (back.ok) close(back.value.litresPerMinute, flow)
        expect(await verifyWorking([...working, ...(back.ok ? back.value.working : [])])).toEqual({
          ok: true,
        })
      }),
      { numRuns: 100 },
    )
  })

  it('refuses no flow, no volume, no time', () => {
    const [volume, flow] = [quantityOf(1000, 'L'), quantityOf(100, 'L/min')]
    const none = quantityOf(0, 'L')
    expect(computeTurnover({ volume: none, flow })).toMatchObject({ refusal: { field: 'volume' } })
    expect(computeTurnover({ volume, flow: quantityOf(0, 'L/min') })).toMatchObject({
      refusal: { field: 'flow' },
    })
    expect(flowForTurnover({ volume, turnover: quantityOf(0, 'min') })).toMatchObject({
      refusal: { field: 'turnover' },
    })
    expect(flowForTurnover({ volume: none, turnover: quantityOf(1, 'min') })).toMatchObject({
      refusal: { field: 'volume' },
    })
  })

  it('a change is a share of the water, and never more than all of it', async () => {
    const half = waterChangeShare({ changed: quantityOf(600, 'L'), netVolume: quantityOf(1.2, 'm3') })
    expect(half).toMatchObject({ ok: true, value: { fraction: 0.5, changedLitres: 600 } })
    expect(await verifyWorking(half.ok ? half.value.working : [])).toEqual({ ok: true })
    for (const [changed, field] of [
      [1201, 'changed'],
      [0, 'changed'],
      [-5, 'changed'],
    ] as const)
      expect(
        waterChangeShare({ changed: quantityOf(changed, 'L'), netVolume: quantityOf(1200, 'L') }),
      ).toMatchObject({ ok: false, refusal: { field } })
  })

  it('what remains lies between the old water and the new, and one change after another is all of them', () => {
    const mg = fc.double({ min: 0, max: 1000, noNaN: true })
    const share = fc.double({ min: 0, max: 1, noNaN: true })
    const times = fc.integer({ min: 0, max: 20 })
    const left = (
      initialMgPerL: number,
      replacementMgPerL: number,
      changeFraction: number,
      changes: number,
    ) => {
      const result = remainingAfterChanges({ initialMgPerL, replacementMgPerL, changeFraction, changes })
      if (!result.ok) throw new Error(result.refusal.code)
      return result.value
    }
    fc.assert(
      fc.property(mg, mg, share, times, times, (initial, fresh, fraction, first, then) => {
        const all = left(initial, fresh, fraction, first + then)
        expect(all).toBeGreaterThanOrEqual(Math.min(initial, fresh) - 1e-9)
        expect(all).toBeLessThanOrEqual(Math.max(initial, fresh) + 1e-9)
        expect(left(left(initial, fresh, fraction, first), fresh, fraction, then)).toBeCloseTo(all, 6)
      }),
    )
  })

  it('refuses changes that cannot be', () => {
    const sound = { initialMgPerL: 100, replacementMgPerL: 0, changeFraction: 0.25, changes: 2 }
    const refused = (change: object) => remainingAfterChanges({ ...sound, ...change })
    expect(refused({ initialMgPerL: NaN })).toMatchObject({ refusal: { code: 'not-finite' } })
    expect(refused({ replacementMgPerL: -1 })).toMatchObject({ refusal: { code: 'below-least' } })
    expect(refused({ changeFraction: 1.1 })).toMatchObject({ refusal: { code: 'fraction-outside-range' } })
    expect(refused({ changeFraction: NaN })).toMatchObject({ refusal: { code: 'fraction-outside-range' } })
    expect(refused({ changes: 1.5 })).toMatchObject({ refusal: { code: 'changes-not-whole' } })
    expect(refused({ changes: Infinity })).toMatchObject({ refusal: { code: 'changes-not-whole' } })
  })
})
