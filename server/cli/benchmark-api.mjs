import { percentile } from './percentile.mjs'

const rounds = 40

/**
 * Times every address that only reads, as the server's own description lists them: lists as they are, details and
 * documents with the first row of their list. Each is asked as the first demonstration account that may read it.
 *
 * @param {string} url
 * @param {{ emails: string[], password: string }} accounts
 * @returns {Promise<{ address: string, kind: 'list' | 'detail' | 'pdf', p50: number, p95: number }[]>} milliseconds, as
 *   a client on this machine sees them
 */
export async function measureApi(url, { emails, password }) {
  const sessions = []
  for (const email of emails) sessions.push(await signIn(url, email, password))
  const get = async (address) => {
    for (const cookie of sessions) {
      const response = await fetch(url + address, { headers: { cookie } })
      const body = Buffer.from(await response.arrayBuffer())
      if (response.status === 200) return { cookie, body, type: response.headers.get('content-type') ?? '' }
    }
    return undefined
  }
  const description = await get('/api/openapi.json')
  if (!description) throw new Error('the description of the API cannot be read')
  const templates = Object.entries(JSON.parse(String(description.body)).paths)
    .filter(([, methods]) => methods.get)
    .map(([address]) => address)
  const measured = []
  for (const template of templates) {
    const address = await fillIn(template, get)
    const first = address && (await get(address))
    if (!first) continue
    const times = []
    for (let round = 0; round < rounds; round += 1) times.push(await timeOf(url + address, first.cookie))
    const kind = first.type.startsWith('application/pdf') ? 'pdf' : template.includes('{') ? 'detail' : 'list'
    measured.push({ address: template, kind, p50: percentile(times, 0.5), p95: percentile(times, 0.95) })
  }
  return measured
}

/** `/api/animals/{number}/weights` with the number of the first animal; undefined when the list has none. */
async function fillIn(template, get) {
  const [, list, name] = /^(.*)\/\{(\w+)\}/.exec(template) ?? []
  if (!list) return template
  if (list.includes('{')) return undefined
  const answer = await get(list)
  if (!answer?.type.startsWith('application/json')) return undefined
  const rows = Object.values(JSON.parse(String(answer.body))).find(Array.isArray)
  const value = rows?.[0]?.[name]
  const address = value === undefined ? undefined : template.replace(`{${name}}`, encodeURIComponent(value))
  return address?.includes('{') ? undefined : address
}

async function timeOf(address, cookie) {
  const begun = performance.now()
  const response = await fetch(address, { headers: { cookie } })
  await response.arrayBuffer()
  if (response.status !== 200) throw new Error(`${address} answered ${response.status}`)
  return performance.now() - begun
}

async function signIn(url, email, password) {
  const response = await fetch(`${url}/api/sign-in`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email, password }),
  })
  if (response.status !== 200) throw new Error(`${email} cannot sign in: ${response.status}`)
  return response.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ')
}
