import { z } from 'zod'
import { counterpartyKinds } from '../domain/register/counterparty-kinds.ts'
import { contract } from './contract.ts'
import { listQuery, page, RecordId, Version } from './primitives.ts'
import { optionalWords, words } from './register-primitives.ts'

export const CounterpartyKindName = z.enum(counterpartyKinds).describe('What kind of party it is')

/** What is written down about another party; one name is one party. */
export const counterpartyFields = {
  name: words(200).describe('Name of the party, as on its papers'),
  kind: CounterpartyKindName,
  address: optionalWords(500, 'Postal address'),
  registration: optionalWords(120, 'Licence or registration number of the party'),
  email: optionalWords(254, 'E-mail address'),
  telephone: optionalWords(60, 'Telephone number'),
  note: optionalWords(2000, 'Note'),
}

export const Counterparty = z.object({
  id: RecordId,
  name: z.string().describe('Name of the party'),
  kind: CounterpartyKindName,
  address: z.string().nullable().describe('Postal address'),
  registration: z.string().nullable().describe('Licence or registration number'),
  email: z.string().nullable().describe('E-mail address'),
  telephone: z.string().nullable().describe('Telephone number'),
  note: z.string().nullable().describe('Note'),
  transactions: z.int().describe('How many transactions name it'),
  version: z.int().describe('Version for saving'),
})
export type Counterparty = z.infer<typeof Counterparty>

const counterpartyParams = z.strictObject({ id: RecordId })

export const listCounterparties = contract({
  id: 'listCounterparties',
  method: 'get',
  path: '/register/counterparties',
  action: 'register.read',
  summary: 'The other parties that animals came from and went to',
  query: listQuery(['name', 'transactions']),
  reply: { 200: page(Counterparty) },
  problems: [],
})

export const NewCounterparty = z.strictObject({ id: RecordId, ...counterpartyFields })
export type NewCounterparty = z.infer<typeof NewCounterparty>

export const enterCounterparty = contract({
  id: 'enterCounterparty',
  method: 'post',
  path: '/register/counterparties',
  action: 'register.manage',
  summary: 'Enter another party',
  body: NewCounterparty,
  reply: { 201: Counterparty },
  problems: ['id-already-used', 'name-already-used'],
  idempotent: 'by-record-id',
})

export const correctCounterparty = contract({
  id: 'correctCounterparty',
  method: 'put',
  path: '/register/counterparties/:id',
  action: 'register.manage',
  summary: 'Correct what is written down about another party; the audit trail keeps what it was',
  params: counterpartyParams,
  body: z.strictObject({ expectedVersion: Version, ...counterpartyFields }),
  reply: { 200: Counterparty },
  problems: ['not-found', 'stale-version', 'name-already-used'],
})
