import { ok, type Result } from '../../../shared/domain/result.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { computeTurnover } from '../../../shared/domain/water/compute-turnover.ts'
import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import { flowForTurnover } from '../../../shared/domain/water/flow-for-turnover.ts'
import { remainingAfterChanges } from '../../../shared/domain/water/remaining-after-changes.ts'
import type { ShapeVolume } from '../../../shared/domain/water/shape-volume.ts'
import type { TankShape } from '../../../shared/domain/water/tank-shape.ts'
import { volumeOfPipe } from '../../../shared/domain/water/volume-of-pipe.ts'
import { volumeOfShape } from '../../../shared/domain/water/volume-of-shape.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { numberOf, quantityIn } from './reading-inputs.ts'

function litresIn(unit: string, volume: Result<ShapeVolume>): Answer {
  if (!volume.ok) return volume
  const shown = convert(volume.value.litres, 'L', unit === 'US gal' ? 'gal_us' : 'L')
  return shown.ok ? ok({ value: shown.value, working: volume.value.lines }) : shown
}

const shaped =
  (tank: (inputs: Inputs) => TankShape): Runner =>
  (inputs, unit) =>
    litresIn(unit, volumeOfShape(tank(inputs)))

const lying = (inputs: Inputs): TankShape => {
  const unit = 'diameter_in' in inputs ? 'in' : 'm'
  const diameter =
    'radius_m' in inputs
      ? quantityOf(2 * numberOf(inputs, 'radius_m'), 'm')
      : quantityIn(inputs, `diameter_${unit}`, unit)
  return {
    shape: 'horizontal-cylinder',
    diameter,
    length: quantityIn(inputs, `length_${unit}`, unit),
    depth: quantityIn(inputs, `water_depth_${unit}`, unit),
  }
}

/** A lying cylinder of 1 m filled to a part of its diameter, against the same cylinder full. */
const fillPercent: Runner = (inputs) => {
  const filled = (depthMetres: number) =>
    volumeOfShape({
      shape: 'horizontal-cylinder',
      diameter: quantityOf(1, 'm'),
      length: quantityOf(1, 'm'),
      depth: quantityOf(depthMetres, 'm'),
    })
  const [part, full] = [filled(numberOf(inputs, 'depth_fraction')), filled(1)]
  if (!part.ok) return part
  if (!full.ok) return full
  return ok({ value: (part.value.litres / full.value.litres) * 100, working: part.value.lines })
}

const systemVolume: Runner = (inputs) => {
  const stated = (key: string, role: 'tank' | 'sump', litres: string) => ({
    key,
    role,
    shape: { shape: 'stated' as const, volume: quantityIn(inputs, litres, 'L') },
    errorPercent: 0,
  })
  const sump = numberOf(inputs, 'sump_water_L') > 0 ? [stated('sump', 'sump', 'sump_water_L')] : []
  const pipe = {
    key: 'pipes',
    bore: quantityOf(Number(inputs.pipe_inner_diameter_mm), 'mm'),
    length: quantityOf(Number(inputs.pipe_length_m), 'm'),
    errorPercent: 0,
  }
  const volume = computeVolume({
    method: 'geometry',
    parts: [stated('tank', 'tank', 'display_L'), ...sump],
    pipes: 'pipe_length_m' in inputs ? [pipe] : [],
    displacement: {
      by: 'share',
      share: quantityIn(inputs, 'decor_displacement_percent', 'percent'),
      errorPercent: 0,
    },
  })
  return volume.ok ? ok({ value: volume.value.netLitres, working: volume.value.working }) : volume
}

const turnover =
  (pick: 'minutes' | 'perDay'): Runner =>
  (inputs) => {
    const result = computeTurnover({
      volume: quantityIn(inputs, 'volume_us_gal', 'gal_us'),
      flow: quantityIn(inputs, 'flow_us_gal_per_min', 'gal_us/min'),
    })
    return result.ok ? ok({ value: result.value[pick], working: result.value.working }) : result
  }

export const waterRunners: Readonly<Record<string, Runner>> = {
  volume_rectangular_L: shaped((inputs) => ({
    shape: 'rectangular',
    length: quantityIn(inputs, 'length_cm', 'cm'),
    width: quantityIn(inputs, 'width_cm', 'cm'),
    depth: quantityIn(inputs, 'water_depth_cm', 'cm'),
  })),
  tank_volume_us_gal: shaped((inputs) => ({
    shape: 'rectangular',
    length: quantityIn(inputs, 'length_in', 'in'),
    width: quantityIn(inputs, 'width_in', 'in'),
    depth: quantityIn(inputs, 'depth_in', 'in'),
  })),
  volume_cylinder_L: shaped((inputs) => ({
    shape: 'cylindrical',
    diameter: quantityIn(inputs, 'diameter_m', 'm'),
    depth: quantityIn(inputs, 'water_depth_m', 'm'),
  })),
  volume_half_cylinder_vertical_L: shaped((inputs) => ({
    shape: 'half-cylindrical',
    diameter: quantityIn(inputs, 'diameter_cm', 'cm'),
    depth: quantityIn(inputs, 'water_depth_cm', 'cm'),
  })),
  volume_cone_bottom_cylinder_L: shaped((inputs) => ({
    shape: 'cone-bottom',
    diameter: quantityIn(inputs, 'diameter_m', 'm'),
    coneHeight: quantityIn(inputs, 'cone_height_m', 'm'),
    depth:
      'water_depth_from_apex_m' in inputs
        ? quantityIn(inputs, 'water_depth_from_apex_m', 'm')
        : quantityOf(numberOf(inputs, 'cylinder_water_depth_m') + numberOf(inputs, 'cone_height_m'), 'm'),
  })),
  volume_bow_front_L: shaped((inputs) => ({
    shape: 'bow-front',
    length: quantityIn(inputs, 'length_cm', 'cm'),
    sideWidth: quantityIn(inputs, 'side_width_cm', 'cm'),
    centreWidth: quantityIn(inputs, 'centre_width_cm', 'cm'),
    depth: quantityIn(inputs, 'water_depth_cm', 'cm'),
  })),
  volume_elliptical_L: shaped((inputs) => ({
    shape: 'elliptical',
    longAxis: quantityIn(inputs, 'long_axis_cm', 'cm'),
    shortAxis: quantityIn(inputs, 'short_axis_cm', 'cm'),
    depth: quantityIn(inputs, 'water_depth_cm', 'cm'),
  })),
  volume_regular_polygon_L: shaped((inputs) => ({
    shape: 'polygon',
    sides: numberOf(inputs, 'sides'),
    measured: 'side',
    side: quantityIn(inputs, 'side_length_cm', 'cm'),
    depth: quantityIn(inputs, 'water_depth_cm', 'cm'),
  })),
  volume_truncated_cone_L: shaped((inputs) => ({
    shape: 'truncated-cone',
    topDiameter: quantityIn(inputs, 'top_diameter_m', 'm'),
    bottomDiameter: quantityIn(inputs, 'bottom_diameter_m', 'm'),
    depth: quantityIn(inputs, 'water_depth_m', 'm'),
  })),
  volume_spherical_cap_L: shaped((inputs) => ({
    shape: 'spherical-cap',
    radius: quantityIn(inputs, 'sphere_radius_m', 'm'),
    depth: quantityIn(inputs, 'water_depth_m', 'm'),
  })),
  volume_hemisphere_L: shaped((inputs) => ({
    shape: 'spherical-cap',
    radius: quantityIn(inputs, 'radius_m', 'm'),
    depth: quantityIn(inputs, 'radius_m', 'm'),
  })),
  volume_horizontal_cylinder_L: shaped(lying),
  fill_percent_horizontal_cylinder: fillPercent,
  pipe_volume_L: (inputs, unit) =>
    litresIn(
      unit,
      volumeOfPipe(
        {
          bore: quantityIn(inputs, 'pipe_inner_diameter_mm', 'mm'),
          length: quantityIn(inputs, 'pipe_length_m', 'm'),
        },
        { key: 'pipe', path: '', params: { role: 'pipe' } },
      ),
    ),
  system_volume_L: systemVolume,
  turnover_min: turnover('minutes'),
  turnovers_per_day: turnover('perDay'),
  flow_for_turnover_L_per_min: (inputs) => {
    const result = flowForTurnover({
      volume: quantityIn(inputs, 'volume_m3', 'm3'),
      turnover: quantityIn(inputs, 'turnover_min', 'min'),
    })
    return result.ok ? ok({ value: result.value.litresPerMinute, working: result.value.working }) : result
  },
  remaining_after_partial_changes: (inputs) => {
    const result = remainingAfterChanges({
      initialMgPerL: numberOf(inputs, 'initial_mg_per_L'),
      replacementMgPerL: numberOf(inputs, 'replacement_mg_per_L'),
      changeFraction: numberOf(inputs, 'change_fraction'),
      changes: numberOf(inputs, 'number_of_changes'),
    })
    return result.ok ? ok({ value: result.value }) : result
  },
}
