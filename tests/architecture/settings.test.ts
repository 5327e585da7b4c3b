import { expect, it } from 'vitest'
import { projectText } from '../support/project-files.ts'

it('.env.example explains every setting the server reads, and no other', () => {
  const read = [...projectText('server/config.ts').matchAll(/^ {2}([A-Z_]+): z\b/gm)].map((match) => match[1])
  expect(read).toContain('DATABASE_URL')
  // said by `npm start` to the server, not by a person
  const settings = read.filter((name) => name !== 'NODE_ENV' && name !== 'PRATIQUE_OWN_CLUSTER')
  const lines = projectText('.env.example').split('\n')
  const explained = lines.flatMap((line, index) => {
    const name = /^#?([A-Z_]+)=/.exec(line)?.[1]
    const before = lines[index - 1] ?? ''
    return name && (/^# /.test(before) || /^#[A-Z_]+=/.test(before)) ? [name] : []
  })
  expect(explained.sort()).toEqual(settings.sort())
})
