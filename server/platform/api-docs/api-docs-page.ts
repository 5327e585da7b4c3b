import { z } from 'zod'
import { successStatus, type Contract } from '../../../shared/contracts/contract.ts'
import { allContracts } from '../../../shared/contracts/index.ts'
import { problemStatus } from '../../../shared/contracts/problems.ts'
import { permissions } from '../../../shared/domain/permissions/table.ts'
import { roles } from '../../../shared/domain/permissions/roles.ts'
import { apiDocsWords as words } from '../../../shared/messages/api-docs.ts'
import { roleNames } from '../../../shared/messages/permissions.ts'
import { problemTitles } from '../../../shared/messages/problems.ts'
import { mediaTypes, refusalsOf } from '../http/replies-of.ts'
import { listFields, type FieldLine } from './list-fields.ts'

const escape = (text: string): string =>
  text.replace(/[&<>"']/g, (sign) => `&#${String(sign.charCodeAt(0))};`)

const code = (text: string): string => `<code>${escape(text)}</code>`

/** Who may ask, from the one table. */
function whoMay({ action }: Contract): string {
  if (action === 'public') return words.anybody
  if (action === 'signed-in') return words.signedIn
  const row = permissions[action]
  return roles
    .filter((role) => row[role] !== 'no')
    .map((role) => {
      const condition = row[role]
      return condition === 'yes'
        ? roleNames[role]
        : words.conditional({ role: roleNames[role], condition: condition.replaceAll('-', ' ') })
    })
    .join(', ')
}

const jsonOf = (schema: z.ZodType, io: 'input' | 'output') =>
  z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Record<string, unknown>

function fieldTable(lines: readonly FieldLine[], caption: string): string {
  if (lines.length === 0) return ''
  const rows = lines.map(({ path, type, meaning, optional }) => {
    const name = path === '' ? escape(words.whole) : code(path)
    const kind = `${escape(type)}${optional ? ` <i>${escape(words.optional)}</i>` : ''}`
    return `<tr><th scope="row">${name}</th><td>${kind}</td><td>${escape(meaning === '' ? '–' : meaning)}</td></tr>`
  })
  const head = [words.field, words.type, words.meaning].map((each) => `<th scope="col">${escape(each)}</th>`)
  return `<div class="wide"><table><caption>${escape(caption)}</caption><thead><tr>${head.join('')}</tr></thead><tbody>${rows.join('')}</tbody></table></div>`
}

const retryWords = {
  'by-key': words.byKey,
  'by-record-id': words.byRecord,
  'nothing-kept': words.kept,
} as const

function problemList(of: Contract): string {
  const codes = refusalsOf(of)
  if (codes.length === 0) return ''
  const items = codes.map(
    (each) => `<li>${String(problemStatus[each])} ${code(each)} ${escape(problemTitles[each])}</li>`,
  )
  return `<h4>${escape(words.problems)}</h4><ul>${items.join('')}</ul>`
}

function operation(of: Contract): string {
  const address = `${of.method.toUpperCase()} /api${of.path}`
  const json = of.produces === undefined || of.produces === 'json'
  const reply = Object.values(of.reply)[0]
  const body = of.body && jsonOf(of.body, 'input')
  const place = [of.params, of.query].flatMap((each) => (each ? listFields(jsonOf(each, 'input')) : []))
  const said = words.reply({ status: String(successStatus(of)), media: mediaTypes[of.produces ?? 'json'] })
  return [
    `<details id="${escape(of.id)}"><summary><code>${escape(address)}</code> <span>${escape(of.summary)}</span></summary>`,
    `<p><b>${escape(words.who)}</b> ${escape(whoMay(of))}</p>`,
    of.idempotent ? `<p>${escape(retryWords[of.idempotent])}</p>` : '',
    fieldTable(place, words.parameters),
    body ? fieldTable(listFields(body), words.body) : '',
    ...(Array.isArray(body?.examples) ? body.examples : []).map(
      (each) => `<h4>${escape(words.example)}</h4><pre>${escape(JSON.stringify(each, null, 2))}</pre>`,
    ),
    reply && json ? fieldTable(listFields(jsonOf(reply, 'output')), said) : `<p>${escape(said)}</p>`,
    problemList(of),
    '</details>',
  ].join('\n')
}

/** `/people/:id` stands among the people. */
const partOf = (of: Contract): string => of.path.split('/')[1] ?? ''

/** The API as a page to read, from the contracts that the server itself parses and guards by. */
export function apiDocsPage(): string {
  const sorted = [...allContracts].sort(
    (a, b) => a.path.localeCompare(b.path) || a.method.localeCompare(b.method),
  )
  const parts = new Map<string, Contract[]>()
  for (const each of sorted) parts.set(partOf(each), [...(parts.get(partOf(each)) ?? []), each])
  const contents = [...parts].map(
    ([part, all]) => `<li><a href="#part-${escape(part)}">${escape(part)}</a> ${String(all.length)}</li>`,
  )
  const sections = [...parts].map(
    ([part, all]) =>
      `<section id="part-${escape(part)}"><h2>${escape(part)}</h2>${all.map(operation).join('\n')}</section>`,
  )
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escape(words.title)} · Pratique</title>
<link rel="icon" href="/favicon.svg">
<link rel="stylesheet" href="/api-docs.css">
</head>
<body>
<header><h1>${escape(words.title)}</h1>
<p>${escape(words.about)}</p>
<p>${escape(words.signIn)}</p>
<p>${escape(words.retry)}</p>
<p>${escape(words.refusals)}</p>
<p>${escape(words.machine)}<a href="/api/openapi.json">/api/openapi.json</a></p></header>
<nav aria-label="${escape(words.contents)}"><ul>${contents.join('')}</ul></nav>
<main>
${sections.join('\n')}
</main>
</body>
</html>
`
}
