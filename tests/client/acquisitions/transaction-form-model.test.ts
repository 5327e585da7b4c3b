import { describe, expect, it } from 'vitest'
import { NewAcquisition, NewDisposition } from '../../../shared/contracts/acquisition-bodies.ts'
import {
  acquisitionBody,
  blankLine,
  blankPermitUse,
  blankTransaction,
  dispositionBody,
  ownFaults,
  rulesOf,
} from '../../../src/features/acquisitions/transaction-form-model.ts'
import type { TransactionValues } from '../../../src/features/acquisitions/transaction-form-model.ts'
import { newId } from '../../../src/lib/new-id.ts'

const zone = 'America/Halifax'
const [taxonId, enclosureId, animalId] = [newId(), newId(), newId()]
const filled = (over: Partial<TransactionValues> = {}): TransactionValues => ({
  ...blankTransaction(),
  kind: 'purchase',
  stage: 'now',
  on: '2026-12-01',
  counterpartyId: newId(),
  lines: [{ ...blankLine(), taxonId, enclosureId, form: 'group', count: '24', known: 'counted' }],
  ...over,
})

describe('the form of an acquisition', () => {
  it('says nothing for a person: a blank form asks for everything', () => {
    const parsed = NewAcquisition.safeParse(acquisitionBody(blankTransaction(), zone))
    const asked = parsed.error?.issues.map((issue) => issue.path.join('.')).sort()
    expect(asked).toEqual([
      'kind',
      'lines.0.count',
      'lines.0.enclosureId',
      'lines.0.form',
      'lines.0.taxonId',
      'on',
      'stage',
    ])
  })

  it('makes the body that the server takes, with what was left empty left out', () => {
    const body = acquisitionBody(filled(), zone)
    expect(NewAcquisition.safeParse(body).error).toBeUndefined()
    expect(body).toMatchObject({
      kind: 'purchase',
      stage: 'now',
      time: null,
      place: null,
      transport: null,
      newCounterparty: null,
      lines: [{ record: 'new', count: 24, estimate: null, sex: 'unknown', lifeStage: 'unknown' }],
      permitUses: [],
    })
  })

  it('counts an individual as one, without asking', () => {
    const line = {
      ...blankLine(),
      taxonId,
      enclosureId,
      form: 'individual' as const,
      transponder: '999 000 000 038 811',
    }
    const body = acquisitionBody(filled({ lines: [line] }), zone)
    expect(NewAcquisition.safeParse(body).error).toBeUndefined()
    expect(body.lines).toMatchObject([
      { count: 1, identifiers: [{ kind: 'transponder', value: '999 000 000 038 811' }] },
    ])
    expect(ownFaults(filled({ lines: [line] }), 'in')).toEqual([])
  })

  it('takes an estimate between two figures, and asks how the number of a group is known', () => {
    const [line] = filled().lines
    const estimated = {
      ...(line ?? blankLine()),
      known: 'estimated' as const,
      estimate: { low: '20', high: '30' },
    }
    expect(acquisitionBody(filled({ lines: [estimated] }), zone).lines).toMatchObject([
      { count: 24, estimate: { low: 20, high: 30 } },
    ])
    expect(ownFaults(filled({ lines: [{ ...(line ?? blankLine()), known: null }] }), 'in')).toEqual([
      'lines.0.known',
    ])
  })

  it('records what befalls the collection as done, and names no party where none has a part', () => {
    const body = acquisitionBody(filled({ kind: 'birth-or-hatch', stage: null }), zone)
    expect(body).toMatchObject({ stage: 'already', counterpartyId: null })
    expect(rulesOf('')).toBeNull()
    expect(ownFaults(filled({ counterpartyId: null }), 'in')).toEqual(['counterpartyId'])
    expect(ownFaults(filled({ kind: 'rescue', counterpartyId: null }), 'in')).toEqual([])
  })

  it('enters a new party instead of one on file', () => {
    const party = { id: newId(), name: ' Point Ansel Hatchery ', kind: 'dealer', registration: '' }
    expect(acquisitionBody(filled({ newCounterparty: party }), zone)).toMatchObject({
      counterpartyId: null,
      newCounterparty: { name: 'Point Ansel Hatchery', kind: 'dealer', registration: null },
    })
  })

  it('reads times of transport by the wall clock of the facility', () => {
    const transport = {
      ...blankTransaction().transport,
      sealedAt: '2026-09-14T08:10',
      openedAt: '2026-12-01T14:20',
      boxCount: '3',
    }
    expect(acquisitionBody(filled({ transport }), zone).transport).toMatchObject({
      sealedAt: '2026-09-14T11:10:00.000Z',
      openedAt: '2026-12-01T18:20:00.000Z',
      boxCount: 3,
    })
  })

  it('adds to a group that is here', () => {
    const line = { ...blankLine(), record: 'existing' as const, animalId, count: '7' }
    const body = acquisitionBody(filled({ lines: [line] }), zone)
    expect(NewAcquisition.safeParse(body).error).toBeUndefined()
    expect(body.lines).toMatchObject([{ record: 'existing', animalId, count: 7 }])
  })

  it('uses a permit for the one line there is, and asks which where there are several', () => {
    const values = filled()
    const use = { ...blankPermitUse(''), permitId: newId(), quantity: '24' }
    expect(acquisitionBody({ ...values, permitUses: [use] }, zone).permitUses).toMatchObject([
      { lineId: values.lines[0]?.id, quantity: 24 },
    ])
    const two = { ...values, lines: [...values.lines, blankLine()], permitUses: [use] }
    const asked = NewAcquisition.safeParse(acquisitionBody(two, zone)).error?.issues.map((i) =>
      i.path.join('.'),
    )
    expect(asked).toContain('permitUses.0.lineId')
  })

  it('asks for a number where something else was typed', () => {
    const [line] = filled().lines
    const parsed = NewAcquisition.safeParse(
      acquisitionBody(filled({ lines: [{ ...(line ?? blankLine()), count: 'a few' }] }), zone),
    )
    expect(parsed.error?.issues.map((issue) => issue.path.join('.'))).toEqual(['lines.0.count'])
  })
})

describe('the form of a departure', () => {
  it('takes the whole of an individual and a number of a group', () => {
    const lines = [
      { ...blankLine(), animalId, chosenForm: 'individual' as const },
      { ...blankLine(), animalId: newId(), chosenForm: 'group' as const, count: '4' },
    ]
    const body = dispositionBody(filled({ kind: 'sale', lines }), zone)
    expect(NewDisposition.safeParse(body).error).toBeUndefined()
    expect(body.lines).toMatchObject([{ animalId, count: 1 }, { count: 4 }])
    expect(Object.keys(body.lines[0] ?? {})).toEqual(['id', 'animalId', 'count'])
  })
})
