import type { Role } from '../domain/permissions/roles.ts'
import { defineMessages } from './define-messages.ts'

export const roleNames = defineMessages({
  veterinarian: 'veterinarian',
  technician: 'technician',
  keeper: 'keeper',
  registrar: 'registrar',
  administrator: 'administrator',
} satisfies Record<Role, string>)

const listed = (names: string[]) =>
  names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} or ${names.at(-1) ?? ''}`

const withArticle = (name: string) => `${/^[aeiou]/.test(name) ? 'an' : 'a'} ${name}`

export const permissionWords = defineMessages({
  whoMay: (p: { roles: readonly Role[] }) =>
    `This is for ${listed(p.roles.map((role) => withArticle(roleNames[role])))}.`,
})
