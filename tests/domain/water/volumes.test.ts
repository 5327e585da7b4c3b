import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import { litresPerCentimetre } from '../../../shared/domain/water/litres-per-centimetre.ts'
import type { TankShape } from '../../../shared/domain/water/tank-shape.ts'
import { volumeOfShape } from '../../../shared/domain/water/volume-of-shape.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { workingLabels } from '../../../shared/messages/working.ts'

const q = (value: string, unit: UnitCode): Quantity => ({ value, unit })
const m = (value: string) => q(value, 'm')

/** A rectangular tank with a sump and pipework, two caves and a standpipe measured by bucket. */
const sheet = {
  method: 'geometry',
  parts: [
    {
      key: 'tank',
      role: 'tank',
      shape: { shape: 'rectangular', length: m('2.40'), width: m('1.20'), depth: m('0.68') },
      errorPercent: 2,
    },
    {
      key: 'sump',
      role: 'sump',
      shape: { shape: 'rectangular', length: m('1.10'), width: m('0.60'), depth: m('0.40') },
      errorPercent: 5,
    },
  ],
  pipes: [{ key: 'pipes', bore: q('57', 'mm'), length: m('14.2'), errorPercent: 10 }],
  displacement: { by: 'volume', volume: q('41', 'L'), errorPercent: 10 },
} as const satisfies VolumeSheet

function determined(of: VolumeSheet) {
  const result = computeVolume(of)
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}

const refusal = (of: unknown) => {
  const result = computeVolume(of as VolumeSheet)
  return result.ok ? 'taken' : result.refusal
}

describe('the volume worksheet', () => {
  it('adds tank, sump and pipes and takes off what is displaced', () => {
    const { grossLitres, displacedLitres, netLitres, displacement } = determined(sheet)
    // 2.40 × 1.20 × 0.68 m = 1,958.4 L; 1.10 × 0.60 × 0.40 m = 264 L; π/4 × 0.057² × 14.2 m = 36.23497 L (by hand)
    expect(grossLitres).toBeCloseTo(1958.4 + 264 + 36.234973, 4)
    expect(displacedLitres).toBe(41)
    expect(netLitres).toBeCloseTo(2217.634973, 4)
    expect(displacement).toBe('measured')
  })

  it('combines the errors of its parts as the root of the sum of squares', () => {
    const { errorLitres, errorPercent, netLitres } = determined(sheet)
    // 39.168, 13.2, 3.6235, 4.1 L
    expect(errorLitres).toBeCloseTo(Math.hypot(39.168, 13.2, 3.6234973, 4.1), 4)
    expect(errorPercent).toBeCloseTo(1.88, 3)
    expect(formatVolumeWithError(netLitres, errorPercent).text.replaceAll('\u00a0', ' ')).toBe(
      '2,220 L ± 1.9 %',
    )
  })

  it('shows its working as a person would write it', () => {
    const shown = determined(sheet).working.map((line) =>
      [
        workingLabels[line.code](line.params),
        formatExpression(line.expression),
        formatWorkingValue(line).text,
      ]
        .join(' | ')
        .replaceAll('\u00a0', ' '),
    )
    expect(shown).toEqual([
      'Tank | 2.40 m × 1.20 m × 0.68 m | 1,958.4 L',
      'Sump | 1.10 m × 0.60 m × 0.40 m | 264.0 L',
      'Pipes | 0.7854 × (57 mm)² × 14.2 m | 36.2 L',
      'Gross volume | 1,958.4 L + 264 L + 36.23 L | 2,258.6 L',
      'Displaced, measured | 41 L | 41.0 L',
      'Net volume, unrounded | 2,258.6 L − 41 L | 2,217.6 L',
      'Error of the volume | sqrt((1,958.4 L × 2 ÷ 100)² + (264 L × 5 ÷ 100)² + (36.23 L × 10 ÷ 100)² + (41 L × 10 ÷ 100)²) | 41.7 L',
      'Error, relative | 41.69 L ÷ 2,217.6 L × 100 | 1.88 %',
    ])
  })

  it('is borne out line by line', async () => {
    expect(await verifyWorking(determined(sheet).working)).toEqual({ ok: true })
  })

  it('says when displacement was not measured, or guessed', async () => {
    const { displacement: _, ...bare } = sheet
    const without = determined(bare)
    expect(without).toMatchObject({ displacement: 'not-measured', displacedLitres: 0 })
    expect(without.netLitres).toBe(without.grossLitres)
    const guessed = determined({
      ...bare,
      displacement: { by: 'share', share: q('12', 'percent'), errorPercent: 50 },
    })
    // of the tank only, not of the sump: 12 % of 1,958.4 L
    expect(guessed.displacedLitres).toBeCloseTo(235.008, 6)
    expect(guessed.displacement).toBe('guessed')
    expect(await verifyWorking(guessed.working)).toEqual({ ok: true })
    expect(await verifyWorking(without.working)).toEqual({ ok: true })
  })

  it('counts an error of the tanks on the water that a displaced share leaves in them', async () => {
    const cube = {
      method: 'geometry',
      parts: [
        {
          key: 'tank',
          role: 'tank',
          shape: { shape: 'rectangular', length: q('1', 'm'), width: q('1', 'm'), depth: q('1', 'm') },
          errorPercent: 10,
        },
      ],
      pipes: [],
      displacement: { by: 'share', share: q('12', 'percent'), errorPercent: 0 },
    } as const
    // 1,000 L ± 10 %, 88 % of it water: 880 ± 88 L, by hand
    const share = determined(cube)
    expect(share.netLitres).toBeCloseTo(880, 9)
    expect(share.errorPercent).toBeCloseTo(10, 9)
    expect(await verifyWorking(share.working)).toEqual({ ok: true })
    // of a displaced volume that was measured by itself the error of the tank is all of it: 880 ± 100 L
    const measured = { by: 'volume', volume: q('120', 'L'), errorPercent: 0 } as const
    expect(determined({ ...cube, displacement: measured }).errorPercent).toBeCloseTo(100 / 8.8, 9)
  })

  it('takes a meter, a dilution or a statement instead', async () => {
    const metered = determined({
      method: 'metered',
      startReading: q('104.20', 'm3'),
      endReading: q('106.44', 'm3'),
      errorPercent: 1,
    })
    expect(metered.netLitres).toBeCloseTo(2240, 6)
    expect(metered).toMatchObject({ displacement: 'not-applicable', displacedLitres: 0, errorPercent: 1 })
    const dilution = determined({
      method: 'salt-dilution',
      saltMass: q('3.36', 'kg'),
      salinityRise: q('1.5', 'g/L'),
      errorPercent: 3,
    })
    expect(dilution.netLitres).toBeCloseTo(2240, 9)
    const stated = determined({ method: 'stated', volume: q('600', 'gal_us'), errorPercent: 10 })
    expect(stated.netLitres).toBeCloseTo(2271.2470704, 9)
    for (const each of [metered, dilution, stated]) {
      expect(each.errorLitres).toBeCloseTo((each.netLitres * each.errorPercent) / 100, 9)
      expect(await verifyWorking(each.working)).toEqual({ ok: true })
    }
  })

  it('tells what a centimetre of depth is worth', () => {
    const tank = sheet.parts[0].shape
    const worth = litresPerCentimetre(tank)
    expect(worth.ok && worth.value).toBeCloseTo(28.8, 9)
    expect(litresPerCentimetre({ ...tank, depth: q('0.5', 'cm') })).toEqual({
      ok: true,
      value: expect.closeTo(14.4),
    })
    expect(litresPerCentimetre({ shape: 'stated', volume: q('5', 'L') })).toEqual({
      ok: true,
      value: undefined,
    })
    expect(litresPerCentimetre({ ...tank, depth: q('0', 'm') })).toMatchObject({ ok: false })
  })

  it('tells it of water barely deeper than a centimetre, too', () => {
    const tank = { shape: 'rectangular', length: m('1'), width: m('1') } as const
    for (const depth of [q('10.0001', 'mm'), q('1.00001', 'cm'), q('0.03281', 'ft'), q('0.3937008', 'in')])
      expect(litresPerCentimetre({ ...tank, depth })).toEqual({ ok: true, value: expect.closeTo(10, 9) })
  })

  it('tells it of a tub where the water stands, which is wider than its mean', () => {
    const tub = {
      shape: 'truncated-cone',
      topDiameter: m('1'),
      bottomDiameter: m('0.5'),
      depth: m('0.5'),
    } as const
    // what is gone when the water stands a centimetre lower, 0.99 m across
    const lower = volumeOfShape({ ...tub, topDiameter: m('0.99'), depth: m('0.49') })
    const [full, worth] = [volumeOfShape(tub), litresPerCentimetre(tub)]
    expect(worth.ok && worth.value).toBeCloseTo(
      full.ok && lower.ok ? full.value.litres - lower.value.litres : NaN,
      9,
    )
    expect(worth.ok && worth.value).toBeCloseTo(7.776, 3)
  })
})

describe('bad input to the worksheet', () => {
  const tank = sheet.parts[0]
  const withShape = (shape: unknown) => ({ ...sheet, parts: [{ ...tank, shape }] })
  const rectangle = tank.shape

  it.each([
    ['zero depth', withShape({ ...rectangle, depth: m('0') }), 'not-above-zero', 'parts.0.depth'],
    ['negative depth', withShape({ ...rectangle, depth: m('-0.68') }), 'not-above-zero', 'parts.0.depth'],
    ['centimetres as metres', withShape({ ...rectangle, depth: m('68') }), 'above-most', 'parts.0.depth'],
    ['absurd length', withShape({ ...rectangle, length: m('240') }), 'above-most', 'parts.0.length'],
    ['blank width', withShape({ ...rectangle, width: m('') }), 'blank', 'parts.0.width'],
    ['no width', withShape({ shape: 'rectangular', length: m('1') }), 'blank', 'parts.0.width'],
    [
      'a mass as a depth',
      withShape({ ...rectangle, depth: q('1', 'kg') }),
      'dimensions-differ',
      'parts.0.depth',
    ],
    ['no such shape', withShape({ shape: 'heart' }), 'unknown-shape', 'parts.0.shape'],
    ['no parts', { ...sheet, parts: [] }, 'no-water-part', 'parts'],
    ['a key twice', { ...sheet, parts: [tank, tank] }, 'part-named-twice', 'parts'],
    ['a reserved key', { ...sheet, parts: [{ ...tank, key: 'net-volume' }] }, 'part-named-twice', 'parts'],
    [
      'error above 100',
      { ...sheet, parts: [{ ...tank, errorPercent: 101 }] },
      'error-outside-range',
      'parts.0.errorPercent',
    ],
    [
      'error NaN',
      { ...sheet, parts: [{ ...tank, errorPercent: NaN }] },
      'error-outside-range',
      'parts.0.errorPercent',
    ],
    [
      'error as text',
      { ...sheet, parts: [{ ...tank, errorPercent: '2' }] },
      'error-outside-range',
      'parts.0.errorPercent',
    ],
    [
      'a second pipe without length',
      { ...sheet, pipes: [...sheet.pipes, { key: 'p2', bore: m('0.05'), length: m('0'), errorPercent: 1 }] },
      'not-above-zero',
      'pipes.1.length',
    ],
    [
      'more displaced than there is',
      { ...sheet, displacement: { by: 'volume', volume: q('1900', 'L'), errorPercent: 1 } },
      'displaces-too-much',
      'displacement',
    ],
    [
      'a share of 105 %',
      { ...sheet, displacement: { by: 'share', share: q('105', 'percent'), errorPercent: 1 } },
      'displaces-too-much',
      'displacement',
    ],
    [
      'a negative share',
      { ...sheet, displacement: { by: 'share', share: q('-1', 'percent'), errorPercent: 1 } },
      'below-least',
      'displacement',
    ],
    [
      'displacement without a tank',
      {
        ...sheet,
        parts: [sheet.parts[1]],
        displacement: { by: 'share', share: q('5', 'percent'), errorPercent: 1 },
      },
      'displaces-too-much',
      'displacement',
    ],
    [
      'a meter running backwards',
      { method: 'metered', startReading: q('5', 'm3'), endReading: q('5', 'm3'), errorPercent: 1 },
      'meter-runs-backwards',
      'endReading',
    ],
    [
      'salinity that fell',
      { method: 'salt-dilution', saltMass: q('3', 'kg'), salinityRise: q('-1', 'g/L'), errorPercent: 1 },
      'salinity-did-not-rise',
      'salinityRise',
    ],
    [
      'a rise on another scale',
      { method: 'salt-dilution', saltMass: q('3', 'kg'), salinityRise: q('1', 'PSS-78'), errorPercent: 1 },
      'dimensions-differ',
      'salinityRise',
    ],
    [
      'an absurd statement',
      { method: 'stated', volume: q('200000', 'm3'), errorPercent: 1 },
      'above-most',
      'volume',
    ],
    [
      'a bare gallon',
      { method: 'stated', volume: { value: '600', unit: 'gal' }, errorPercent: 1 },
      'gallon-not-stated',
      'volume',
    ],
    [
      'a dilution beyond any tank',
      { method: 'salt-dilution', saltMass: q('900', 't'), salinityRise: q('0.001', 'mg/L'), errorPercent: 1 },
      'above-most',
      'netVolume',
    ],
  ])('%s is refused by name', (_, input, code, field) => {
    expect(refusal(input)).toMatchObject({ code, field })
  })

  it.each<[string, TankShape, string, string]>([
    [
      'a lying cylinder fuller than full',
      { shape: 'horizontal-cylinder', diameter: m('1'), length: m('2'), depth: m('1.2') },
      'deeper-than-shape',
      'depth',
    ],
    [
      'a bowl deeper than its sphere',
      { shape: 'spherical-cap', radius: m('0.5'), depth: m('1.1') },
      'deeper-than-shape',
      'depth',
    ],
    [
      'a bow that goes in',
      { shape: 'bow-front', length: m('1'), sideWidth: m('0.5'), centreWidth: m('0.4'), depth: m('0.5') },
      'narrower-than-side',
      'centreWidth',
    ],
    [
      'a bow beyond half a circle',
      { shape: 'bow-front', length: m('1'), sideWidth: m('0.5'), centreWidth: m('1.1'), depth: m('0.5') },
      'deeper-than-shape',
      'centreWidth',
    ],
    [
      'axes the wrong way round',
      { shape: 'elliptical', longAxis: m('1'), shortAxis: m('2'), depth: m('1') },
      'axes-swapped',
      'shortAxis',
    ],
    [
      'two and a half sides',
      { shape: 'polygon', sides: 2.5, measured: 'side', side: m('1'), depth: m('1') },
      'sides-not-whole',
      'sides',
    ],
    [
      'a pentagon across flats',
      { shape: 'polygon', sides: 5, measured: 'across-flats', side: m('1'), depth: m('1') },
      'sides-not-whole',
      'sides',
    ],
  ])('%s is refused by name', (_, shape, code, field) => {
    expect(volumeOfShape(shape)).toMatchObject({ ok: false, refusal: { code, field } })
  })
})
