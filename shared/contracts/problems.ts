import { z } from 'zod'

/**
 * Every refusal that can cross the wire (RFC 9457), with its status. The title is in messages/problems.ts under the
 * same code. `401` not signed in · `403` may not · `404` absent or hidden · `409` state or version · `422` content ·
 * `429` slow down · `503` busy, try again.
 */
export const problemStatus = {
  'malformed-json': 400,
  'bad-input': 422,
  'not-found': 404,
  'unknown-route': 404,
  'not-signed-in': 401,
  'sign-in-failed': 401,
  'sign-in-locked': 429,
  'password-change-required': 403,
  'password-wrong': 403,
  'password-too-weak': 422,
  'may-not': 403,
  'foreign-origin': 403,
  'too-many-requests': 429,
  'stale-version': 409,
  'id-already-used': 409,
  'idempotency-key-missing': 422,
  'idempotency-key-reused': 409,
  'number-already-used': 409,
  'email-already-used': 409,
  'last-administrator': 409,
  'period-reversed': 422,
  'in-the-future': 422,
  busy: 503,
  'file-missing': 422,
  'file-too-large': 422,
  'file-type-not-allowed': 422,
  'broken-record': 409,
  'already-confirmed': 409,
  'another-person-needed': 403,
  'licence-not-valid': 403,
  'kind-has-no-water': 409,
  'belongs-to-enclosure': 409,
  'same-body-twice': 422,
  'not-one-water': 409,
  'already-void': 409,
  'isolation-ended': 409,
  'isolation-needed': 409,
  'isolation-not-standing': 409,
  'valve-state-unknown': 409,
  'volume-covers-other-water': 409,
  'taxon-already-known': 409,
  'weight-needs-confirmation': 422,
  'not-here-then': 409,
  'not-in-that-enclosure': 409,
  'contradicts-another-move': 409,
  'enclosure-not-in-use': 409,
  'movement-locked': 409,
  'documented-transfer-needed': 403,
  'part-of-another-record': 409,
  'not-a-group': 409,
  'not-a-single-animal': 409,
  'count-too-small': 409,
  'discrepancy-open': 409,
  'taxa-differ': 409,
  'mark-already-carried': 409,
  'already-resolved': 409,
  'later-records': 409,
  'name-already-used': 409,
  'already-voided': 409,
  'already-explained': 409,
  'permit-does-not-cover': 409,
  'fingerprint-not-unique': 409,
  'order-incomplete': 422,
  'caution-stops': 409,
  'cautions-unread': 409,
  'working-disagrees': 409,
  'nothing-to-sign': 409,
  'order-ended': 409,
  'not-held': 409,
  'dose-not-possible': 409,
  'first-calculation-missing': 409,
  'outside-working-order': 500,
} as const satisfies Record<string, number>

export type ProblemCode = keyof typeof problemStatus

/** One field that has to change. */
export const FieldProblem = z.object({
  pointer: z.string().describe('JSON pointer into the body, or /params/… or /query/…'),
  detail: z.string().describe('What to do about it, in plain words'),
  code: z.string().optional().describe('Stable code of the refusal, where an engine refused'),
})
export type FieldProblem = z.infer<typeof FieldProblem>

/** The wire form of every refusal, `application/problem+json`. */
export const ProblemBody = z.looseObject({
  type: z.string().describe('Relative address that names the kind of problem'),
  title: z.string().describe('The kind of problem in words'),
  status: z.int().describe('The HTTP status, repeated'),
  code: z.string().describe('Stable code of the problem'),
  detail: z.string().optional().describe('What happened this time and the next step'),
  instance: z.string().optional().describe('The address that was called'),
  request_id: z.string().describe('Give this to whoever looks after the installation'),
  errors: z.array(FieldProblem).optional().describe('Every field at fault, not only the first'),
})
export type ProblemBody = z.infer<typeof ProblemBody>
