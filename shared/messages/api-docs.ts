import { defineMessages } from './define-messages.ts'

/** The page that describes the API. */
export const apiDocsWords = defineMessages({
  title: 'The API',
  about:
    'Every address, made from the same descriptions that the server parses and guards by. Decision support for licensed professionals: check every figure against local law, the label and the safety data sheet.',
  machine: 'The same for a program: ',
  signIn:
    'Every call but the public ones needs the session cookie of a person who signed in, and may do no more than that person. A call that changes something is sent with content type application/json.',
  retry:
    'A retry is recognised by the new record’s own id in the body, or by the Idempotency-Key header, as each address says.',
  refusals:
    'A refusal is application/problem+json with a stable code, what to do in words, and a pointer to every field at fault.',
  contents: 'Contents',
  who: 'Who may',
  anybody: 'anybody, without signing in',
  signedIn: 'whoever signed in',
  conditional: (p: { role: string; condition: string }) => `${p.role} (${p.condition})`,
  parameters: 'In the address',
  body: 'Body',
  reply: (p: { status: string; media: string }) => `Reply ${p.status}, ${p.media}`,
  nothing: 'nothing',
  problems: 'Refusals',
  field: 'Field',
  type: 'Type',
  meaning: 'Meaning',
  optional: 'optional',
  whole: 'the whole of it',
  example: 'Example',
  byKey: 'A retry carries the same Idempotency-Key.',
  byRecord: 'A retry carries the same record id.',
  kept: 'Nothing is kept: it can be asked as often as wanted.',
})
