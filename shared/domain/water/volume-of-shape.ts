import { refuse, type Result } from '../result.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import { statedVolume } from './stated-volume.ts'
import type { TankShape } from './tank-shape.ts'
import { volumeOfBowFront } from './volume-of-bow-front.ts'
import { volumeOfConeBottom } from './volume-of-cone-bottom.ts'
import { volumeOfCylinder } from './volume-of-cylinder.ts'
import { volumeOfEllipse } from './volume-of-ellipse.ts'
import { volumeOfHorizontalCylinder } from './volume-of-horizontal-cylinder.ts'
import { volumeOfPolygon } from './volume-of-polygon.ts'
import { volumeOfRectangle } from './volume-of-rectangle.ts'
import { volumeOfSphericalCap } from './volume-of-spherical-cap.ts'
import { volumeOfTruncatedCone } from './volume-of-truncated-cone.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

const alone: ShapePlace = { key: 'tank', path: '', params: { role: 'tank' } }

/**
 * The water that a shape holds at its depth, with its working.
 *
 * @param place names its lines and refused fields; a tank on its own by default
 * @refuses as the function of the shape · unknown-shape
 */
export function volumeOfShape(
  tank: TankShape,
  place: ShapePlace = alone,
): Result<ShapeVolume, VolumeRefusal> {
  switch (tank.shape) {
    case 'rectangular':
      return volumeOfRectangle(tank, place)
    case 'cylindrical':
    case 'half-cylindrical':
      return volumeOfCylinder(tank, place)
    case 'cone-bottom':
      return volumeOfConeBottom(tank, place)
    case 'bow-front':
      return volumeOfBowFront(tank, place)
    case 'elliptical':
      return volumeOfEllipse(tank, place)
    case 'polygon':
      return volumeOfPolygon(tank, place)
    case 'truncated-cone':
      return volumeOfTruncatedCone(tank, place)
    case 'spherical-cap':
      return volumeOfSphericalCap(tank, place)
    case 'horizontal-cylinder':
      return volumeOfHorizontalCylinder(tank, place)
    case 'stated':
      return statedVolume(tank, place)
    default:
      return refuse('unknown-shape', `${place.path}shape`)
  }
}
