import { z } from 'zod'
import { EnteredQuantity } from './primitives.ts'

const ErrorPercent = z
  .number('Type the error in percent')
  .min(0, 'An error cannot be below zero')
  .max(100, 'An error above 100 % says nothing about the volume')
  .describe('Relative error, percent, one side')
const length = (what: string) => EnteredQuantity.describe(what)
const depth = length('Depth of the water from the inside floor to the surface')
const diameter = length('Inside diameter')

/** Inside measures of one shape of water. Names and meaning as in the engine. */
export const TankShapeBody = z
  .discriminatedUnion('shape', [
    z.strictObject({
      shape: z.literal('rectangular').describe('Straight walls'),
      length: length('Inside length'),
      width: length('Inside width'),
      depth,
    }),
    z.strictObject({ shape: z.literal('cylindrical').describe('Round, upright'), diameter, depth }),
    z.strictObject({
      shape: z.literal('half-cylindrical').describe('Half round with a flat back'),
      diameter,
      depth,
    }),
    z.strictObject({
      shape: z.literal('cone-bottom').describe('Round with a cone below'),
      diameter,
      coneHeight: length('Height of the cone'),
      depth: length('Depth of the water from the tip of the cone'),
    }),
    z.strictObject({
      shape: z.literal('bow-front').describe('Curved front'),
      length: length('Inside length'),
      sideWidth: length('Inside width at the sides'),
      centreWidth: length('Inside width at the middle'),
      depth,
    }),
    z.strictObject({
      shape: z.literal('elliptical').describe('Oval'),
      longAxis: length('Full long axis'),
      shortAxis: length('Full short axis'),
      depth,
    }),
    z.strictObject({
      shape: z.literal('polygon').describe('Regular, several sides'),
      sides: z.int().min(3).max(24).describe('Number of sides'),
      measured: z.enum(['side', 'across-flats']).describe('What was measured'),
      side: length('One side, or the distance across the flats'),
      depth,
    }),
    z.strictObject({
      shape: z.literal('truncated-cone').describe('Round with sloping walls'),
      topDiameter: length('Inside diameter at the water line'),
      bottomDiameter: length('Inside diameter at the floor'),
      depth,
    }),
    z.strictObject({
      shape: z.literal('spherical-cap').describe('Dished floor'),
      radius: length('Radius of the sphere'),
      depth,
    }),
    z.strictObject({
      shape: z.literal('horizontal-cylinder').describe('A cylinder on its side'),
      diameter,
      length: length('Inside length'),
      depth,
    }),
    z.strictObject({
      shape: z.literal('stated').describe('A volume from a drawing or a label'),
      volume: EnteredQuantity.describe('The stated volume'),
    }),
  ])
  .describe('Shape of the water and its inside measures')

const Key = z
  .string()
  .regex(/^[a-z0-9-]{1,40}$/)
  .describe('Names the part in the working; unique in the sheet')
const PartName = z.string().trim().min(1).max(80).optional().describe('As people call the part')

/** How somebody came to know how much water there is: the same sheet on the bench, in the form and in the record. */
export const VolumeSheetBody = z
  .discriminatedUnion('method', [
    z.strictObject({
      method: z.literal('geometry').describe('From inside measures'),
      parts: z
        .array(
          z.strictObject({
            key: Key,
            role: z.enum(['tank', 'sump', 'vessel']).describe('What the part is'),
            name: PartName,
            shape: TankShapeBody,
            errorPercent: ErrorPercent,
          }),
        )
        .min(1, 'Measure at least one tank')
        .max(20)
        .describe('Tanks, sumps and vessels of this water'),
      pipes: z
        .array(
          z.strictObject({
            key: Key,
            name: PartName,
            bore: length('Inner diameter of the pipe'),
            length: length('Length of the pipe'),
            errorPercent: ErrorPercent,
          }),
        )
        .max(20)
        .describe('Pipework, full of water'),
      displacement: z
        .discriminatedUnion('by', [
          z.strictObject({
            by: z.literal('volume').describe('Measured, for example by bucket'),
            volume: EnteredQuantity.describe('Water displaced'),
            errorPercent: ErrorPercent,
          }),
          z.strictObject({
            by: z.literal('share').describe('Guessed as a share of the tanks'),
            share: EnteredQuantity.describe('Share of the volume of the tanks, percent'),
            errorPercent: ErrorPercent,
          }),
        ])
        .optional()
        .describe('What rock, decoration and standpipes take the place of'),
    }),
    z.strictObject({
      method: z.literal('metered').describe('A water meter read before and after filling'),
      startReading: EnteredQuantity.describe('Meter before filling'),
      endReading: EnteredQuantity.describe('Meter after filling'),
      errorPercent: ErrorPercent,
    }),
    z.strictObject({
      method: z.literal('stated').describe('A figure from a record or a label; counts as an estimate'),
      volume: EnteredQuantity.describe('The stated net volume'),
      errorPercent: ErrorPercent,
    }),
    z.strictObject({
      method: z.literal('salt-dilution').describe('Salt weighed in, and the rise that it made'),
      saltMass: EnteredQuantity.describe('Salt weighed in'),
      salinityRise: EnteredQuantity.describe('Rise of the salt in the water, g/L'),
      errorPercent: ErrorPercent,
    }),
  ])
  .describe('One way of knowing how much water there is')
