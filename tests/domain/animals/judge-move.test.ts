import { describe, expect, it } from 'vitest'
import { judgeMove } from '../../../shared/domain/animals/judge-move.ts'
import { discrepancyKinds } from '../../../shared/domain/animals/discrepancy.ts'
import {
  quarantineKindNames,
  quarantineKindOf,
  taxonGroupNames,
} from '../../../shared/domain/taxa/taxon-group.ts'

const free = { own: [], leaves: [], enters: [] }
const quarantined = { ...free, own: [{ kind: 'boundary' }] } as const
const locked = { ...free, own: [{ kind: 'boundary' }, { kind: 'all' }] } as const

describe('whether an animal may be moved', () => {
  it('freely when it was never in quarantine or has been cleared', () => {
    expect(judgeMove(free, null, 'Quarantine wing')).toEqual({ may: 'yes' })
    expect(judgeMove(free, 'Quarantine wing', null)).toEqual({ may: 'yes' })
  })

  it('inside its boundary while it is in quarantine, across it only as a documented transfer', () => {
    expect(judgeMove(quarantined, 'Quarantine wing', 'Quarantine wing')).toEqual({ may: 'yes' })
    for (const to of [null, 'Jelly quarantine', undefined])
      expect(judgeMove(quarantined, 'Quarantine wing', to)).toEqual({ may: 'documented-transfer' })
  })

  it('never on the strength of two places that lie in no boundary at all', () => {
    expect(judgeMove(quarantined, null, null)).toEqual({ may: 'documented-transfer' })
  })

  it('not at all under a full lock, inside its boundary neither', () => {
    expect(judgeMove(locked, 'Quarantine wing', 'Quarantine wing')).toEqual({ may: 'no' })
  })

  it('out of the water of a case as if it were one of its animals, whatever it is itself', () => {
    const out = { ...free, leaves: [{ kind: 'boundary' }] } as const
    expect(judgeMove(out, 'Quarantine wing', null)).toEqual({ may: 'documented-transfer' })
    expect(judgeMove(out, 'Quarantine wing', undefined)).toEqual({ may: 'documented-transfer' })
    expect(judgeMove(out, 'Quarantine wing', 'Quarantine wing')).toEqual({ may: 'yes' })
  })

  it('into the water of a running case, but neither into nor out of water under a full lock', () => {
    expect(judgeMove({ ...free, enters: [{ kind: 'boundary' }] }, null, 'Quarantine wing')).toEqual({
      may: 'yes',
    })
    for (const side of ['leaves', 'enters'] as const)
      expect(judgeMove({ ...free, [side]: [{ kind: 'all' }] }, 'Wing', 'Wing')).toEqual({ may: 'no' })
  })
})

describe('words that rules rest on', () => {
  it('gives every group of taxa a quarantine kind, and leaves no kind without a group', () => {
    expect(new Set(taxonGroupNames.map(quarantineKindOf))).toEqual(new Set(quarantineKindNames))
    expect(quarantineKindOf('elasmobranch')).toBe('fish')
    expect(quarantineKindOf('cephalopod')).toBe('invertebrate')
  })

  it('asks a veterinarian about broken locks and the registrar about counts', () => {
    expect(discrepancyKinds['moved-under-lock']).toBe('veterinarian')
    expect(discrepancyKinds['more-than-counted']).toBe('registrar')
  })
})
