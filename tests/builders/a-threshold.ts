import { newKey, password } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

/** A value of the facility for a threshold, proposed by a technician and confirmed by a veterinarian. */
export async function putInForce(api: TestApi, ruleId: string, key: string, value: string): Promise<void> {
  const { agent } = await api.as('technician')
  const rules = (await agent.get('/api/caution-rules').expect(200)).body.rules as {
    ruleId: string
    parameters: { key: string; unit: string; versions: { id: string }[] }[]
  }[]
  const parameter = rules.find((rule) => rule.ruleId === ruleId)?.parameters.find((one) => one.key === key)
  if (!parameter) throw new Error(`${ruleId} has no ${key}`)
  const id = api.nextId()
  const at = `/api/caution-rules/${ruleId}/parameters/${key}/proposals`
  await agent
    .post(at)
    .send({
      id,
      value,
      unit: parameter.unit,
      supersedesId: parameter.versions[0]?.id ?? null,
      reason: 'the meters here read low',
    })
    .expect(201)
  const vet = await api.as('veterinarian')
  await vet.agent
    .post(`${at}/${id}/confirmation`)
    .set('Idempotency-Key', newKey())
    .send({ password, reason: 'checked against the log of the meters', jurisdiction: 'Norrell Sound' })
    .expect(200)
}
