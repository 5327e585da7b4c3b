import { describe, expect, it } from 'vitest'
import { recordReadings } from '../../../shared/contracts/water.contract.ts'
import { parameterOf, readingParameters } from '../../../shared/domain/readings/parameters.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import {
  emptyField,
  entryUnitsOf,
  judgeField,
  pointerOf,
  readingsBody,
  unitOptionsOf,
} from '../../../src/features/water/reading-form-model.ts'
import type { ReadingField } from '../../../src/features/water/reading-form-model.ts'

const id = (n: number) => `019a0000-0000-7000-8000-00000000000${String(n)}`
const field = (n: number, more: Partial<ReadingField>): ReadingField => ({
  id: id(n),
  parameter: 'temperature',
  value: '',
  unit: 'degC',
  below: false,
  ...more,
})
const where = { waterBodyId: id(9), happenedAt: '2026-12-01T12:00:00Z', instrument: ' Meter 4 ' }

describe('the form of readings', () => {
  it('sends what was filled in, as the contract wants it', () => {
    const fields = [
      field(1, {}),
      field(2, { value: ' 25.60 ' }),
      field(3, { parameter: 'ph', value: '8.1', unit: 'pH-nbs' }),
      field(4, { parameter: 'total-ammonia-n', value: '0.05', unit: 'mg/L', below: true }),
    ]
    const body = readingsBody(fields, where)
    expect(recordReadings.body?.safeParse(body).success).toBe(true)
    expect(body.readings).toEqual([
      { id: id(2), parameter: 'temperature', value: { value: '25.60', unit: 'degC' }, instrument: 'Meter 4' },
      {
        id: id(3),
        parameter: 'ph',
        value: { value: '8.1', unit: 'pH' },
        scale: 'nbs',
        instrument: 'Meter 4',
      },
      {
        id: id(4),
        parameter: 'total-ammonia-n',
        value: { value: '0.05', unit: 'mg/L' },
        below: true,
        instrument: 'Meter 4',
      },
    ])
  })

  it('finds the field that the server refused, though empty fields are not sent', () => {
    const [empty, first, second] = [field(1, {}), field(2, { value: '1' }), field(3, { value: '2' })]
    expect(pointerOf([empty, first, second], second, 'value')).toBe('/readings/1/value')
  })

  it('offers units of the parameter’s own dimensions only, and none that the scale of a pH lacks', () => {
    for (const parameter of readingParameters) {
      const units = unitOptionsOf(parameter).map((option) => option.unit)
      expect(units.length, parameter).toBeGreaterThan(0)
      for (const unit of units)
        expect(parameterOf(parameter).dimensions, `${parameter} in ${unit}`).toContain(
          isUnitCode(unit) ? unitOf(unit).dimension : 'no unit',
        )
    }
    expect(entryUnitsOf('ph').map((option) => option.unit)).toEqual(['pH-nbs', 'pH-total'])
  })

  it('opens on the usual unit where nothing was measured before', () => {
    expect(emptyField(id(1), 'alkalinity', undefined)).toMatchObject({ unit: 'mg/L_CaCO3', value: '' })
  })

  it('says at once what the server would refuse', () => {
    expect(judgeField(field(1, { value: '256' }), undefined).wrong).toMatch(/at most 60/)
    expect(judgeField(field(1, { value: 'warm' }), undefined).wrong).toBeTruthy()
    expect(judgeField(field(1, {}), undefined)).toEqual({})
  })
})
