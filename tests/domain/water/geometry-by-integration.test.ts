import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { litresPerCentimetre } from '../../../shared/domain/water/litres-per-centimetre.ts'
import { shapeNames, type ShapeName, type TankShape } from '../../../shared/domain/water/tank-shape.ts'
import { volumeOfPipe } from '../../../shared/domain/water/volume-of-pipe.ts'
import { volumeOfShape } from '../../../shared/domain/water/volume-of-shape.ts'

/**
 * The integral of f from a to b, by the double-exponential rule: the places where f is taken crowd towards the ends, so
 * that the upright walls of circles there cost no digits. f has to be smooth between a and b.
 */
function integral(f: (x: number) => number, a: number, b: number): number {
  const [middle, half] = [(a + b) / 2, (b - a) / 2]
  const step = 1 / 16
  let sum = 0
  for (let t = -3.5; t <= 3.5; t += step) {
    const inner = (Math.PI / 2) * Math.sinh(t)
    const weight = ((Math.PI / 2) * Math.cosh(t)) / Math.cosh(inner) ** 2
    sum += weight * f(middle + half * Math.tanh(inner))
  }
  return sum * step * half
}

/** Half of the chord that a circle has at this distance from its centre. */
const halfChord = (radius: number, distance: number) =>
  Math.sqrt(Math.max(0, (radius - distance) * (radius + distance)))

/** Area of a figure between two x, from how far it reaches across at each x; cut where its outline has corners. */
function areaBetween(across: (x: number) => number, cuts: readonly number[]): number {
  return cuts.slice(1).reduce((sum, cut, i) => sum + integral(across, cuts[i] ?? cut, cut), 0)
}

const disc = (diameter: number) =>
  areaBetween((x) => 2 * halfChord(diameter / 2, x), [-diameter / 2, diameter / 2])

/**
 * A tank by nothing but its outline: how large the surface is when the water stands at a height, and at which heights the
 * wall has a corner.
 */
interface Outline {
  surface: (height: number) => number
  corners: readonly number[]
}

const upright = (squareMetres: number): Outline => ({ surface: () => squareMetres, corners: [] })

/** The corners of a regular polygon, found by walking round it; the first side lies on the x axis. */
function walk(sides: number, side: number): { x: number; y: number }[] {
  let at = { x: 0, y: 0 }
  return Array.from({ length: sides }, (_, i) => {
    const from = at
    const course = (2 * Math.PI * i) / sides
    at = { x: from.x + side * Math.cos(course), y: from.y + side * Math.sin(course) }
    return from
  })
}

function polygonArea(sides: number, side: number): number {
  const corners = walk(sides, side)
  const edges = corners.map((from, i) => [from, corners[(i + 1) % sides] ?? from] as const)
  const across = (x: number) => {
    const met = edges
      .filter(([from, to]) => Math.min(from.x, to.x) <= x && x <= Math.max(from.x, to.x))
      .filter(([from, to]) => Math.abs(to.x - from.x) > 1e-12 * side)
      .map(([from, to]) => from.y + ((to.y - from.y) * (x - from.x)) / (to.x - from.x))
    return met.length === 0 ? 0 : Math.max(...met) - Math.min(...met)
  }
  const cuts = corners.map(({ x }) => x).sort((a, b) => a - b)
  return areaBetween(across, cuts)
}

/** How far the flat opposite lies from the flat on the x axis, of a polygon of this side. */
const acrossFlats = (sides: number, side: number) => Math.max(...walk(sides, side).map(({ y }) => y))

/** The front of a bow-front tank at x from its middle: the circle through both front corners and the middle of the bow. */
function bowAt(length: number, sideWidth: number, centreWidth: number): (x: number) => number {
  // The centre lies on the middle line where corner and bow are equally far: sought by halving, from far behind.
  let [behind, before] = [-1e6 * length, centreWidth]
  const nearerToBow = (y: number) => centreWidth - y < Math.hypot(length / 2, sideWidth - y)
  for (let i = 0; i < 200; i += 1) {
    const y = (behind + before) / 2
    if (nearerToBow(y)) before = y
    else behind = y
  }
  return (x) => before + halfChord(centreWidth - before, x)
}

interface Kind {
  tank: (depth: Quantity) => TankShape
  /** Metres of water that it can hold at most. */
  deepest: number
  outline: Outline
}

/** Lengths as a person types them: whole millimetres from 1 cm to 6 m. */
const metres = fc.integer({ min: 10, max: 6000 }).map((mm) => mm / 1000)
const m = (value: number) => quantityOf(value, 'm')
const openTop = 6

const kinds: Record<Exclude<ShapeName, 'stated'>, fc.Arbitrary<Kind>> = {
  rectangular: fc.tuple(metres, metres).map(([length, width]) => ({
    tank: (depth) => ({ shape: 'rectangular', length: m(length), width: m(width), depth }),
    deepest: openTop,
    outline: upright(areaBetween(() => width, [0, length])),
  })),
  cylindrical: metres.map((diameter) => ({
    tank: (depth) => ({ shape: 'cylindrical', diameter: m(diameter), depth }),
    deepest: openTop,
    outline: upright(disc(diameter)),
  })),
  'half-cylindrical': metres.map((diameter) => ({
    tank: (depth) => ({ shape: 'half-cylindrical', diameter: m(diameter), depth }),
    deepest: openTop,
    // from the flat back to the wall, once and not to both sides
    outline: upright(areaBetween((x) => halfChord(diameter / 2, x), [-diameter / 2, diameter / 2])),
  })),
  'cone-bottom': fc.tuple(metres, metres).map(([diameter, coneHeight]) => ({
    tank: (depth) => ({ shape: 'cone-bottom', diameter: m(diameter), coneHeight: m(coneHeight), depth }),
    deepest: openTop + coneHeight,
    outline: {
      surface: (height) => disc(diameter * Math.min(1, height / coneHeight)),
      corners: [coneHeight],
    },
  })),
  'bow-front': fc
    .tuple(metres, metres, fc.integer({ min: 1, max: 999 }))
    .map(([length, sideWidth, thousandths]) => {
      // the front stands out by at most half the length, a half circle
      const centreWidth = sideWidth + (length / 2) * (thousandths / 1000)
      const front = bowAt(length, sideWidth, centreWidth)
      return {
        tank: (depth: Quantity): TankShape => ({
          shape: 'bow-front',
          length: m(length),
          sideWidth: m(sideWidth),
          centreWidth: m(centreWidth),
          depth,
        }),
        deepest: openTop,
        outline: upright(areaBetween(front, [-length / 2, length / 2])),
      }
    }),
  elliptical: fc.tuple(metres, metres).map(([one, other]) => {
    const [long, short] = [Math.max(one, other), Math.min(one, other)]
    // a circle seen aslant: every chord is shorter by the same share
    const across = (x: number) => (2 * halfChord(long / 2, x) * short) / long
    return {
      tank: (depth: Quantity): TankShape => ({
        shape: 'elliptical',
        longAxis: m(long),
        shortAxis: m(short),
        depth,
      }),
      deepest: openTop,
      outline: upright(areaBetween(across, [-long / 2, long / 2])),
    }
  }),
  polygon: fc.tuple(fc.integer({ min: 3, max: 24 }), metres, fc.boolean()).map(([sides, side, flats]) => {
    const measured = flats && sides % 2 === 0 ? 'across-flats' : 'side'
    const along = measured === 'side' ? side : side / acrossFlats(sides, 1)
    return {
      tank: (depth: Quantity): TankShape => ({ shape: 'polygon', sides, measured, side: m(side), depth }),
      deepest: openTop,
      outline: upright(polygonArea(sides, along)),
    }
  }),
  'truncated-cone': fc.tuple(metres, metres, metres).map(([top, bottom, height]) => ({
    // the top is where the water stands: a tub filled less is a tub of another top
    tank: (depth) => {
      const full = Number(depth.value)
      return {
        shape: 'truncated-cone',
        topDiameter: m(bottom + ((top - bottom) * full) / height),
        bottomDiameter: m(bottom),
        depth,
      }
    },
    deepest: height,
    outline: { surface: (at) => disc(bottom + ((top - bottom) * at) / height), corners: [] },
  })),
  'spherical-cap': metres.map((radius) => ({
    tank: (depth) => ({ shape: 'spherical-cap', radius: m(radius), depth }),
    deepest: 2 * radius,
    outline: { surface: (height) => disc(2 * halfChord(radius, radius - height)), corners: [] },
  })),
  'horizontal-cylinder': fc.tuple(metres, metres).map(([diameter, length]) => ({
    tank: (depth) => ({ shape: 'horizontal-cylinder', diameter: m(diameter), length: m(length), depth }),
    deepest: diameter,
    outline: {
      surface: (height) => length * 2 * halfChord(diameter / 2, diameter / 2 - height),
      corners: [],
    },
  })),
}

/** Litres of water between two heights. */
function litresBetween({ surface, corners }: Outline, low: number, high: number): number {
  const cuts = [low, ...corners.filter((corner) => low < corner && corner < high), high]
  return areaBetween(surface, cuts) * 1000
}

/** Shares of the deepest water: a film, anything between, and full to the brim. */
const share = fc.oneof(fc.constantFrom(0, 0.25, 0.5, 0.999, 1), fc.double({ min: 0, max: 1, noNaN: true }))

/** A depth in metres as a rule is read, to a tenth of a millimetre, and never dry. */
const depthOf = (deepest: number, part: number) => Math.max(1, Math.floor(deepest * part * 10_000)) / 10_000

function close(found: number, expected: number, within: number): void {
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(within)
}

const relative = 1e-9

describe('the rule of integration itself', () => {
  it('finds areas that are known', () => {
    close(
      integral((x) => x ** 2, 0, 3),
      9,
      1e-12,
    )
    close(integral(Math.sin, 0, Math.PI), 2, 1e-12)
    close(disc(2), Math.PI, 1e-11)
    close(polygonArea(4, 2), 4, 1e-12)
    close(polygonArea(6, 1), 2.598076211353316, 1e-12)
    close(acrossFlats(4, 2), 2, 1e-12)
  })

  it('has an outline for every shape that has one', () => {
    expect(Object.keys(kinds).sort()).toEqual(shapeNames.filter((name) => name !== 'stated').sort())
  })
})

const each = Object.entries(kinds)

describe.each(each)('%s', (_, kind) => {
  it('holds what its outline encloses, at any depth', () => {
    fc.assert(
      fc.property(kind, share, ({ tank, deepest, outline }, part) => {
        const depth = depthOf(deepest, part)
        const result = volumeOfShape(tank(m(depth)))
        if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
        const expected = litresBetween(outline, 0, depth)
        expect(result.value.litres).toBeGreaterThan(0)
        close(result.value.litres, expected, relative * expected)
      }),
      { numRuns: 200 },
    )
  })
})

describe.each(each)('%s', (_, kind) => {
  it('has in its uppermost centimetre what its outline encloses there', () => {
    fc.assert(
      fc.property(kind, share, ({ tank, deepest, outline }, part) => {
        const depth = depthOf(deepest, part)
        const result = litresPerCentimetre(tank(m(depth)))
        if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
        const expected = litresBetween(outline, Math.max(0, depth - 0.01), depth)
        // it is a difference of two volumes, which keeps the roundings of both
        const rounding = 1e-13 * litresBetween(outline, 0, depth)
        close(result.value ?? NaN, expected, relative * expected + rounding)
      }),
      { numRuns: 200 },
    )
  })
})

describe('a pipe', () => {
  it('holds its bore along its length', () => {
    fc.assert(
      fc.property(fc.integer({ min: 5, max: 600 }), metres, (boreMillimetres, length) => {
        const bore = boreMillimetres / 1000
        const result = volumeOfPipe(
          { bore: m(bore), length: m(length) },
          { key: 'pipes', path: '', params: {} },
        )
        if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
        const expected = litresBetween(upright(disc(bore)), 0, length)
        close(result.value.litres, expected, relative * expected)
      }),
    )
  })
})
