import { ok } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import type { Quantity } from '../../domain/units/quantity.ts'
import { computeVolume } from '../../domain/water/compute-volume.ts'
import { shapeNames, type TankShape } from '../../domain/water/tank-shape.ts'
import type { VolumeSheet } from '../../domain/water/volume-sheet.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { volumeUnits } from './parts/volume-input.ts'

const lengths = ['cm', 'm', 'mm', 'in', 'ft'] as const
const share = { units: ['percent'], limits: { min: 0, max: 100 }, optional: true } as const
const shapes = shapeNames.filter((shape) => shape !== 'stated')
const lengthOf = (...of: (typeof shapes)[number][]) =>
  quantity({ units: lengths, limits: { above: 0 }, when: { shape: of } })

const nothing: Quantity = { value: '', unit: 'cm' }
const entered = (given: ParsedQuantity | undefined): Quantity => given?.entered ?? nothing

/** The water of a tank from its inside lengths, with its sump and pipes, less what stands in it. */
export const tankVolume = defineCalculator({
  id: 'tank-volume',
  group: 'volume',
  weekly: true,
  words: defineMessages({
    name: 'Volume of a tank and its system',
    purpose: 'The net water of a tank of any usual shape, with sump and pipes, less what stands in it.',
    formula: 'net = tank × (1 − displaced share) + sump + π ÷ 4 × bore² × length of pipe',
    'input.shape': 'Shape of the tank',
    'option.shape.rectangular': 'Rectangular',
    'option.shape.cylindrical': 'Upright cylinder',
    'option.shape.half-cylindrical': 'Half cylinder with a flat back',
    'option.shape.cone-bottom': 'Cylinder on a cone',
    'option.shape.bow-front': 'Bow front',
    'option.shape.elliptical': 'Ellipse',
    'option.shape.polygon': 'Regular polygon',
    'option.shape.truncated-cone': 'Sloping sides, round',
    'option.shape.spherical-cap': 'Dished floor',
    'option.shape.horizontal-cylinder': 'Lying cylinder',
    'input.length': 'Inside length',
    'input.width': 'Inside width',
    'input.diameter': 'Inside diameter',
    'input.coneHeight': 'Height of the cone',
    'input.sideWidth': 'Inside width at the side',
    'input.centreWidth': 'Inside width in the middle',
    'input.longAxis': 'Long axis, full',
    'input.shortAxis': 'Short axis, full',
    'input.sides': 'Number of sides',
    'input.measured': 'How the polygon was measured',
    'option.measured.side': 'Along one side',
    'option.measured.across-flats': 'From flat to flat',
    'input.side': 'That length',
    'input.topDiameter': 'Diameter at the water line',
    'input.bottomDiameter': 'Diameter at the floor',
    'input.radius': 'Radius of the sphere',
    'input.depth': 'Depth of the water',
    'help.depth': 'From the lowest point of the inside floor to the surface, not the height of the wall.',
    'input.tankError': 'Error of the tank',
    'input.displaced': 'Share displaced by rock and sand',
    'help.displaced': 'Left open or 0 where nobody measured it.',
    'input.sump': 'Water in the sump, running',
    'input.bore': 'Inner diameter of the pipes',
    'input.pipeLength': 'Length of the pipes',
    'result.net': 'Net volume',
    'result.gross': 'Gross volume',
    'caution.displacement-not-measured':
      'Nothing was subtracted for rock, sand or decoration. Too large a volume overdoses: measure it by a bucket, a meter or salt.',
    'caution.displacement-guessed':
      'The displaced share is a guess. 10 to 15 % for rock is common practice, no source.',
    'caution.measure': 'A metered fill or a salt dilution is better than lengths.',
  }),
  inputs: {
    shape: choice(shapes),
    length: lengthOf('rectangular', 'bow-front', 'horizontal-cylinder'),
    width: lengthOf('rectangular'),
    diameter: lengthOf('cylindrical', 'half-cylindrical', 'cone-bottom', 'horizontal-cylinder'),
    coneHeight: lengthOf('cone-bottom'),
    sideWidth: lengthOf('bow-front'),
    centreWidth: lengthOf('bow-front'),
    longAxis: lengthOf('elliptical'),
    shortAxis: lengthOf('elliptical'),
    sides: quantity({
      units: ['ratio'],
      whole: true,
      limits: { min: 3, max: 24 },
      when: { shape: ['polygon'] },
    }),
    measured: choice(['side', 'across-flats'], { when: { shape: ['polygon'] } }),
    side: lengthOf('polygon'),
    topDiameter: lengthOf('truncated-cone'),
    bottomDiameter: lengthOf('truncated-cone'),
    radius: lengthOf('spherical-cap'),
    depth: quantity({ units: lengths, limits: { above: 0 } }),
    tankError: quantity({ ...share, units: ['percent'] }),
    displaced: quantity({ units: ['percent'], limits: { min: 0, max: 95 }, optional: true }),
    sump: quantity({ units: volumeUnits, limits: { above: 0 }, optional: true }),
    bore: quantity({ units: ['mm', 'cm', 'in'], limits: { above: 0 }, optional: true }),
    pipeLength: quantity({ units: ['m', 'ft'], limits: { above: 0 }, optional: true }),
  },
  fields: {
    'parts.1.volume': 'sump',
    'pipes.0.length': 'pipeLength',
    'pipes.0.bore': 'bore',
    errorPercent: 'tankError',
    parts: 'shape',
    netVolume: 'shape',
    displacement: 'displaced',
    share: 'displaced',
  },
  example: {
    shape: 'rectangular',
    length: { value: '120', unit: 'cm' },
    width: { value: '50', unit: 'cm' },
    depth: { value: '45', unit: 'cm' },
    tankError: { value: '2', unit: 'percent' },
    displaced: { value: '12', unit: 'percent' },
    sump: { value: '60', unit: 'L' },
    bore: { value: '50', unit: 'mm' },
    pipeLength: { value: '0.92', unit: 'm' },
  },
  sources: ['mensuration', 'nist-sp-811'],
  cautions: [{ code: 'measure', level: 'note' }],
  carries: [{ to: 'volume', sheet: sheetOf }],
  published: [
    'volume_rectangular_L',
    'tank_volume_us_gal',
    'volume_cylinder_L',
    'volume_half_cylinder_vertical_L',
    'volume_cone_bottom_cylinder_L',
    'volume_bow_front_L',
    'volume_elliptical_L',
    'volume_regular_polygon_L',
    'volume_truncated_cone_L',
    'volume_spherical_cap_L',
    'volume_hemisphere_L',
    'volume_horizontal_cylinder_L',
    'pipe_volume_L',
    'system_volume_L',
  ],
  compute(given) {
    const { displaced } = given
    const volume = computeVolume(sheetOf(given))
    if (!volume.ok) return volume
    const { netLitres, grossLitres, errorLitres, working } = volume.value
    return ok({
      figures: [
        { key: 'net', value: netLitres, unit: 'L', kind: 'volume' },
        { key: 'gross', value: grossLitres, unit: 'L', kind: 'volume' },
      ],
      working,
      ...(errorLitres > 0 ? { range: { low: netLitres - errorLitres, high: netLitres + errorLitres } } : {}),
      cautions: [
        displaced && displaced.value > 0
          ? { code: 'displacement-guessed', level: 'note' as const }
          : { code: 'displacement-not-measured', level: 'warning' as const },
      ],
    })
  },
})

type Measured = { shape: (typeof shapes)[number] } & Partial<
  Record<string, ParsedQuantity | string | undefined>
>

/** The sheet of the determination; an error that nobody stated is zero. */
function sheetOf(given: Measured): VolumeSheet {
  const at = (name: string) => given[name] as ParsedQuantity | undefined
  const [sump, bore, pipeLength, displaced] = [at('sump'), at('bore'), at('pipeLength'), at('displaced')]
  return {
    method: 'geometry',
    parts: [
      { key: 'tank', role: 'tank', shape: shapeOf(given), errorPercent: at('tankError')?.value ?? 0 },
      ...(sump
        ? [
            {
              key: 'sump',
              role: 'sump' as const,
              shape: { shape: 'stated' as const, volume: sump.entered },
              errorPercent: 0,
            },
          ]
        : []),
    ],
    pipes:
      bore || pipeLength
        ? [{ key: 'pipes', bore: entered(bore), length: entered(pipeLength), errorPercent: 0 }]
        : [],
    // a share of 0 is no measurement: it is the same as none
    ...(displaced && displaced.value > 0
      ? { displacement: { by: 'share' as const, share: displaced.entered, errorPercent: 0 } }
      : {}),
  }
}

function shapeOf(given: Measured): TankShape {
  const at = (name: string) => entered(given[name] as ParsedQuantity | undefined)
  const depth = at('depth')
  switch (given.shape) {
    case 'rectangular':
      return { shape: 'rectangular', length: at('length'), width: at('width'), depth }
    case 'cylindrical':
    case 'half-cylindrical':
      return { shape: given.shape, diameter: at('diameter'), depth }
    case 'cone-bottom':
      return { shape: 'cone-bottom', diameter: at('diameter'), coneHeight: at('coneHeight'), depth }
    case 'bow-front': {
      const [length, sideWidth, centreWidth] = [at('length'), at('sideWidth'), at('centreWidth')]
      return { shape: 'bow-front', length, sideWidth, centreWidth, depth }
    }
    case 'elliptical':
      return { shape: 'elliptical', longAxis: at('longAxis'), shortAxis: at('shortAxis'), depth }
    case 'polygon': {
      const measured = given.measured === 'across-flats' ? 'across-flats' : 'side'
      return { shape: 'polygon', sides: Number(at('sides').value), measured, side: at('side'), depth }
    }
    case 'truncated-cone': {
      const [topDiameter, bottomDiameter] = [at('topDiameter'), at('bottomDiameter')]
      return { shape: 'truncated-cone', topDiameter, bottomDiameter, depth }
    }
    case 'spherical-cap':
      return { shape: 'spherical-cap', radius: at('radius'), depth }
    case 'horizontal-cylinder':
      return { shape: 'horizontal-cylinder', diameter: at('diameter'), length: at('length'), depth }
  }
}
