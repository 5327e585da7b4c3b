import { describe, expect, it } from 'vitest'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { isForRoles, lanesOf, todayKindNames, todayKinds } from '../../../shared/domain/today/today-kinds.ts'

const kindsOf = (...roles: Role[]) => todayKindNames.filter((kind) => isForRoles(kind, roles))
const lanesSeenBy = (...roles: Role[]) => [...new Set(kindsOf(...roles).map((kind) => todayKinds[kind].lane))]

describe('whose work it is', () => {
  it('is the veterinarian’s to decide, and they may help at the tanks', () => {
    expect(lanesSeenBy('veterinarian')).toEqual(['urgent', 'decide', 'doses', 'watch'])
    expect(kindsOf('veterinarian')).not.toContain('discrepancy-registrar')
    expect(lanesOf(['veterinarian'])).toEqual(['urgent', 'decide'])
  })
  it('is the technician’s to dose, sample and measure, and not to decide', () => {
    expect(lanesSeenBy('technician')).toEqual(['urgent', 'doses', 'watch'])
    expect(kindsOf('technician')).toContain('volume-to-confirm')
  })
  it('is the keeper’s to watch; a keeper may stop a bath and calculate second, but gives none', () => {
    expect(kindsOf('keeper')).toEqual(
      expect.arrayContaining(['observation', 'bath-running', 'second-calculation', 'sample']),
    )
    for (const kind of ['dose', 'volume-to-confirm', 'order-draft', 'case-ready', 'order-held'] as const)
      expect(kindsOf('keeper')).not.toContain(kind)
  })
  it('is the registrar’s to keep the papers, and to answer an urgent call', () => {
    expect(lanesSeenBy('registrar')).toEqual(['urgent', 'register'])
    expect(kindsOf('registrar')).toContain('discrepancy-registrar')
  })
  it('is the administrator’s to look after people and settings, and nothing of the animals', () => {
    expect(lanesSeenBy('administrator')).toEqual(['people'])
  })
  it('is the union for somebody with several roles, and nothing for somebody with none', () => {
    expect(kindsOf('keeper', 'registrar')).toEqual(
      todayKindNames.filter((kind) => isForRoles(kind, ['keeper']) || isForRoles(kind, ['registrar'])),
    )
    expect(lanesOf(['registrar', 'keeper'])).toEqual(['urgent', 'watch', 'register'])
    expect(kindsOf()).toEqual([])
  })
})
