import { z } from 'zod'
import { settingKeys } from '../domain/settings/settings.ts'
import { contract } from './contract.ts'
import { Instant, Reason, RecordId } from './primitives.ts'

const SettingKeyName = z.enum(settingKeys as [string, ...string[]]).describe('Key of the setting')

export const Setting = z.object({
  key: SettingKeyName,
  value: z.string().describe('The value in force'),
  state: z
    .enum(['default', 'confirmed'])
    .describe('Project default, not confirmed; or confirmed by a person'),
  confirmedBy: z.string().nullable().describe('Who confirmed it'),
  confirmedAt: Instant.nullable().describe('When it was confirmed'),
  proposal: z
    .object({
      id: RecordId,
      value: z.string().describe('The proposed value'),
      proposedBy: z.string().describe('Who proposed it'),
      proposedAt: Instant.describe('When it was proposed'),
      reason: z.string().nullable().describe('Why'),
    })
    .nullable()
    .describe('A newer value that waits for confirmation'),
})
export type Setting = z.infer<typeof Setting>

export const listSettings = contract({
  id: 'listSettings',
  method: 'get',
  path: '/settings',
  action: 'facility.read',
  summary: 'Every facility setting, with who confirmed it and when',
  reply: { 200: z.object({ settings: z.array(Setting).describe('All settings') }) },
  problems: [],
})

export const proposeSetting = contract({
  id: 'proposeSetting',
  method: 'post',
  path: '/settings/:key/proposals',
  action: 'facility.manage',
  summary: 'Propose a value for a setting',
  params: z.strictObject({ key: SettingKeyName }),
  body: z.strictObject({
    id: RecordId,
    value: z.string().max(500).describe('The value'),
    reason: Reason.optional(),
  }),
  reply: { 201: Setting },
  problems: ['id-already-used'],
  idempotent: 'by-record-id',
})

export const confirmSetting = contract({
  id: 'confirmSetting',
  method: 'post',
  path: '/settings/:key/proposals/:proposalId/confirmation',
  action: 'facility.manage',
  summary: 'Confirm a proposed value; it is in force from then on',
  params: z.strictObject({ key: SettingKeyName, proposalId: RecordId }),
  reply: { 200: Setting },
  problems: ['not-found', 'already-confirmed', 'stale-version'],
  idempotent: 'by-key',
})
