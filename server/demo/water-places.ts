import type { EnclosureKind } from '../../shared/domain/places/enclosure-kind.ts'
import type { LifeSupportKind } from '../../shared/domain/places/life-support-kind.ts'
import type { TankShape } from '../../shared/domain/water/tank-shape.ts'

/** What kind of water it is: decides which parameters are measured, and around what. */
export type Climate = 'temperate-sea' | 'tropical-sea' | 'river' | 'amphibian'

export interface DemoEnclosure {
  code: string
  name: string
  kind: EnclosureKind
  description: string
  treatmentVessel?: { mark: string; litres: string }
  /** The water in it; absent for a place that nobody measured. */
  shape?: TankShape
  displacedLitres?: string
}

/** Enclosures that share one water through a sump, with its valves and machines. */
export interface DemoWater {
  area: string
  boundary: string | null
  airSpace: string | null
  climate: Climate | null
  enclosures: readonly DemoEnclosure[]
  sump?: { code: string; name: string; shape: TankShape }
  pipe?: { bore: string; length: string }
  machines: readonly { code: string; name: string; kind: LifeSupportKind }[]
  /** How often it is measured. */
  everyDays: 1 | 2
  volume: 'confirmed' | 'to-confirm' | 'none'
}

const m = (value: string) => ({ value, unit: 'm' as const })
const box = (length: string, width: string, depth: string): TankShape => ({
  shape: 'rectangular',
  length: m(length),
  width: m(width),
  depth: m(depth),
})
const round = (diameter: string, depth: string): TankShape => ({
  shape: 'cylindrical',
  diameter: m(diameter),
  depth: m(depth),
})

/** One system of the quarantine wing: a tank, its sump, its pipes and its machines. */
function quarantineSystem(
  number: number,
  given: { name: string; climate: Climate; shape: TankShape; description: string; displacedLitres?: string },
): DemoWater {
  const n = String(number)
  return {
    area: 'Quarantine wing',
    boundary: 'Quarantine wing',
    // Each system stands in a room of its own: a fish that comes into one restarts no other
    airSpace: `Quarantine room ${n}`,
    climate: given.climate,
    enclosures: [
      {
        code: `QT-${n}`,
        name: given.name,
        kind: 'tank',
        description: given.description,
        shape: given.shape,
        ...(given.displacedLitres ? { displacedLitres: given.displacedLitres } : {}),
      },
    ],
    sump: { code: `QS-${n}`, name: `Sump of QT-${n}`, shape: box('1.10', '0.60', '0.40') },
    pipe: { bore: '57', length: '14.2' },
    machines: [
      { code: `BF-${n}`, name: `Biofilter of QT-${n}`, kind: 'biofilter' },
      { code: `UV-${n}`, name: `UV of QT-${n}`, kind: 'uv' },
      { code: `AC-${n}`, name: `Carbon of QT-${n}`, kind: 'carbon' },
      { code: `AE-${n}`, name: `Air of QT-${n}`, kind: 'aeration' },
      ...(given.climate === 'river' || given.climate === 'amphibian'
        ? []
        : [{ code: `FF-${n}`, name: `Foam fractionator of QT-${n}`, kind: 'foam-fractionator' as const }]),
    ],
    everyDays: 1,
    volume: 'confirmed',
  }
}

/** The water of the invented Harrow Point Sea Hall: a temperate coast, a river, a jelly room, a quarantine wing. */
export const demoWaters: readonly DemoWater[] = [
  {
    area: 'Kelp hall',
    boundary: null,
    airSpace: null,
    climate: 'temperate-sea',
    enclosures: [
      {
        code: 'KH-1',
        name: 'Kelp forest',
        kind: 'pool',
        description: 'Rectangular, concrete, rockwork along the north wall.',
        shape: box('9.60', '5.20', '3.40'),
        displacedLitres: '11500',
      },
      {
        code: 'KH-2',
        name: 'Tide table',
        kind: 'pool',
        description: 'Shallow touch pool on the water of the kelp forest.',
        shape: box('4.20', '1.40', '0.32'),
        displacedLitres: '210',
      },
    ],
    sump: { code: 'KS-1', name: 'Kelp hall sump', shape: box('3.20', '1.80', '1.10') },
    pipe: { bore: '142', length: '64' },
    machines: [
      { code: 'FL-K1', name: 'Sand filter of the kelp hall', kind: 'filter' },
      { code: 'FF-K1', name: 'Foam fractionator of the kelp hall', kind: 'foam-fractionator' },
      { code: 'OZ-K1', name: 'Ozone of the kelp hall', kind: 'ozone' },
      { code: 'CH-K1', name: 'Chiller of the kelp hall', kind: 'chiller' },
    ],
    everyDays: 2,
    volume: 'confirmed',
  },
  {
    area: 'Kelp hall',
    boundary: null,
    airSpace: null,
    climate: 'temperate-sea',
    enclosures: [
      {
        code: 'OC-1',
        name: 'Octopus den',
        kind: 'tank',
        description: 'Rectangular, acrylic, lockable lid. Its own water.',
        shape: box('1.60', '0.90', '0.80'),
        displacedLitres: '62',
      },
    ],
    sump: { code: 'OS-1', name: 'Sump of the octopus den', shape: box('0.90', '0.50', '0.38') },
    pipe: { bore: '44', length: '6.5' },
    machines: [
      { code: 'BF-O1', name: 'Biofilter of the octopus den', kind: 'biofilter' },
      { code: 'CH-O1', name: 'Chiller of the octopus den', kind: 'chiller' },
    ],
    everyDays: 2,
    volume: 'confirmed',
  },
  {
    area: 'River gallery',
    boundary: null,
    airSpace: null,
    climate: 'river',
    enclosures: [
      {
        code: 'RG-1',
        name: 'Upper river',
        kind: 'pool',
        description: 'Stream bed in three steps, gravel.',
        shape: box('6.40', '1.80', '0.75'),
        displacedLitres: '940',
      },
      {
        code: 'RG-2',
        name: 'Sturgeon run',
        kind: 'pool',
        description: 'Long oval pool with a window.',
        shape: { shape: 'elliptical', longAxis: m('7.20'), shortAxis: m('3.60'), depth: m('1.35') },
        displacedLitres: '320',
      },
    ],
    sump: { code: 'RS-1', name: 'River sump', shape: box('2.40', '1.20', '0.90') },
    pipe: { bore: '103', length: '38' },
    machines: [
      { code: 'FL-R1', name: 'Drum filter of the river', kind: 'filter' },
      { code: 'BF-R1', name: 'Biofilter of the river', kind: 'biofilter' },
      { code: 'UV-R1', name: 'UV of the river', kind: 'uv' },
    ],
    everyDays: 2,
    volume: 'confirmed',
  },
  {
    area: 'Jelly room',
    boundary: null,
    airSpace: null,
    climate: 'temperate-sea',
    enclosures: [
      {
        code: 'JR-1',
        name: 'Moon jelly wheel',
        kind: 'tank',
        description: 'A drum on its side with a gentle turning current.',
        shape: {
          shape: 'horizontal-cylinder',
          diameter: m('1.50'),
          length: m('0.60'),
          depth: m('1.38'),
        },
      },
      {
        code: 'JR-2',
        name: 'Sea nettle window',
        kind: 'tank',
        description: 'Half round with a flat back.',
        shape: { shape: 'half-cylindrical', diameter: m('2.20'), depth: m('1.05') },
      },
    ],
    sump: { code: 'JS-1', name: 'Jelly room sump', shape: box('1.40', '0.80', '0.55') },
    pipe: { bore: '57', length: '22' },
    machines: [
      { code: 'FL-J1', name: 'Bag filter of the jelly room', kind: 'filter' },
      { code: 'CH-J1', name: 'Chiller of the jelly room', kind: 'chiller' },
    ],
    everyDays: 2,
    volume: 'to-confirm',
  },
  {
    area: 'Ray pool',
    boundary: null,
    airSpace: null,
    climate: 'tropical-sea',
    enclosures: [
      {
        code: 'RP-1',
        name: 'Ray pool',
        kind: 'pool',
        description: 'Round, fibreglass, sand floor.',
        shape: round('6.00', '1.20'),
        displacedLitres: '1650',
      },
    ],
    sump: { code: 'PS-1', name: 'Ray pool sump', shape: box('2.00', '1.00', '0.80') },
    pipe: { bore: '103', length: '26' },
    machines: [
      { code: 'FL-P1', name: 'Sand filter of the ray pool', kind: 'filter' },
      { code: 'HT-P1', name: 'Heater of the ray pool', kind: 'heater' },
    ],
    everyDays: 2,
    volume: 'confirmed',
  },
  quarantineSystem(1, {
    name: 'Reef arrivals',
    climate: 'tropical-sea',
    shape: box('2.40', '1.20', '0.68'),
    description: 'Rectangular, glass-fibre.',
    displacedLitres: '41.0',
  }),
  quarantineSystem(2, {
    name: 'Seahorse system',
    climate: 'tropical-sea',
    shape: box('1.80', '0.90', '0.70'),
    description: 'Rectangular, glass. Hitching posts of plastic mesh.',
    displacedLitres: '18',
  }),
  quarantineSystem(3, {
    name: 'Ray isolation',
    climate: 'tropical-sea',
    shape: round('3.00', '0.85'),
    description: 'Round, glass-fibre, bare floor.',
  }),
  quarantineSystem(4, {
    name: 'River arrivals',
    climate: 'river',
    shape: box('3.00', '1.20', '0.75'),
    description: 'Rectangular, glass-fibre, with a cover.',
  }),
  quarantineSystem(5, {
    name: 'Amphibian racks',
    climate: 'amphibian',
    shape: box('1.20', '0.60', '0.25'),
    description: 'Shallow trays with a dry end. Chytrid protocol at the door.',
    displacedLitres: '9',
  }),
  quarantineSystem(6, {
    name: 'Spare system',
    climate: 'temperate-sea',
    shape: box('2.00', '1.00', '0.70'),
    description: 'Rectangular, glass-fibre. Kept running with mature filters.',
  }),
  {
    area: 'Treatment room',
    boundary: null,
    airSpace: null,
    climate: null,
    enclosures: [
      {
        code: 'TT-1',
        name: 'Treatment tub',
        kind: 'tub',
        description: 'Round tub on wheels, marked inside.',
        treatmentVessel: { mark: 'red line', litres: '400' },
        shape: { shape: 'stated', volume: { value: '400', unit: 'L' } },
      },
    ],
    machines: [{ code: 'AE-T1', name: 'Air of the treatment tub', kind: 'aeration' }],
    everyDays: 2,
    volume: 'confirmed',
  },
  {
    area: 'Treatment room',
    boundary: null,
    airSpace: null,
    climate: null,
    enclosures: [
      {
        code: 'DB-1',
        name: 'Dip bucket',
        kind: 'dip-bucket',
        description: 'Bucket with marks every 5 L.',
        treatmentVessel: { mark: '20 L mark', litres: '20' },
        shape: { shape: 'stated', volume: { value: '20', unit: 'L' } },
      },
    ],
    machines: [],
    everyDays: 2,
    volume: 'none',
  },
  {
    area: 'Loading bay',
    boundary: null,
    airSpace: null,
    climate: null,
    enclosures: [
      { code: 'TR-1', name: 'Transport tank', kind: 'transport', description: 'Insulated, 1 m³.' },
    ],
    machines: [],
    everyDays: 2,
    volume: 'none',
  },
]

/** A land area has no water: it stands apart from the waters. */
export const demoLand = {
  code: 'LA-1',
  name: 'Shore bird beach',
  area: 'River gallery',
  description: 'Sand and driftwood behind a net.',
}
