import { describe, expect, it } from 'vitest'
import { decide, rolesThatMay } from '../../../shared/domain/permissions/decide.ts'
import { roles } from '../../../shared/domain/permissions/roles.ts'
import { actions, permissions } from '../../../shared/domain/permissions/table.ts'

/** The table as people read it, kept in docs/. */
function asMarkdown(): string {
  const head = `| action | ${roles.join(' | ')} |`
  const line = `| --- |${roles.map(() => ' --- |').join('')}`
  const rows = actions.map(
    (action) => `| ${action} | ${roles.map((role) => permissions[action][role]).join(' | ')} |`,
  )
  const title =
    '# Who may do what\n\nMade from `shared/domain/permissions/table.ts` by its test; a word in a cell is a condition explained there.\n'
  return [title, head, line, ...rows, ''].join('\n')
}

describe('the permission table', () => {
  it('is what was agreed, and what docs/permissions.md says', async () => {
    await expect(asMarkdown()).toMatchFileSnapshot('../../../docs/permissions.md')
  })

  it('adds up the rights of several roles', () => {
    expect(decide('people.manage', ['keeper', 'administrator']).allowed).toBe(true)
    expect(decide('people.manage', ['keeper', 'registrar'])).toEqual({
      allowed: false,
      why: 'role',
      conditions: [],
    })
    expect(decide('people.manage', []).allowed).toBe(false)
  })

  it('lets a right that depends on facts through to the service, which decides with them', () => {
    expect(decide('order.sign', ['veterinarian'])).toEqual({
      allowed: true,
      why: null,
      conditions: ['valid-licence'],
    })
    expect(decide('order.sign', ['veterinarian'], { 'valid-licence': true }).allowed).toBe(true)
    expect(decide('order.sign', ['veterinarian'], {})).toEqual({
      allowed: false,
      why: 'valid-licence',
      conditions: [],
    })
  })

  it('never gates stopping: veterinarian, technician and keeper may stop and hold without a condition', () => {
    for (const action of ['bath.stop', 'order.hold', 'case.hold'] as const)
      for (const role of ['veterinarian', 'technician', 'keeper'] as const)
        expect(permissions[action][role]).toBe('yes')
  })

  it('lets only a licensed veterinarian sign', () => {
    for (const action of ['order.sign', 'case.clear', 'necropsy.sign', 'caution.override'] as const) {
      expect(rolesThatMay(action)).toEqual(['veterinarian'])
      expect(permissions[action].veterinarian).toBe('valid-licence')
    }
  })
})
