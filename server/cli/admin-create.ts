import { parseArgs } from 'node:util'
import { Email, PersonName } from '../../shared/contracts/primitives.ts'
import { installation } from '../platform/http/request-context.ts'
import { withComposition } from './connect.ts'

const usage = 'npm run admin:create -- --email you@example.org --name "Your Name"\n'

// npm run admin:create: the first administrator of an installation without the practice scenario
await withComposition(async ({ people, parts }) => {
  const { values } = parseArgs({ options: { email: { type: 'string' }, name: { type: 'string' } } })
  const email = Email.safeParse(values.email)
  const name = PersonName.safeParse(values.name)
  if (!email.success || !name.success) {
    process.stderr.write(`Give an e-mail address and a name:\n${usage}`)
    return 2
  }
  const { oneTimePassword } = await people.service.enterPerson(
    { actor: installation, requestId: 'admin:create' },
    { id: parts.ids.next(), email: email.data, printedName: name.data, roles: ['administrator'] },
  )
  process.stdout.write(
    `${name.data} is administrator. Sign in as ${email.data} with the one-time password ${oneTimePassword ?? ''} and change it.\n`,
  )
  return 0
})
