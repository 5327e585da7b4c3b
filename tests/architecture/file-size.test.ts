import { expect, it } from 'vitest'
import { projectFiles, projectText } from '../support/project-files.ts'

const limitLines = 400

/** Tables of data, which would only be harder to check against their sources in pieces. Nothing else belongs here. */
const dataTables: readonly string[] = []

const sources = projectFiles().filter((file) => /^(src|server|shared|tests)\/.*\.(tsx?|m?js|css)$/.test(file))
const linesOf = (file: string) => projectText(file).trimEnd().split('\n').length

it(`no file of code has more than ${limitLines} lines`, () => {
  expect(sources.length).toBeGreaterThan(20)
  const tooLong = sources.filter((file) => !dataTables.includes(file) && linesOf(file) > limitLines)
  expect(tooLong.map((file) => `${file}: ${linesOf(file)}`)).toEqual([])
})

it('the list of exceptions holds only files that need it', () => {
  expect(dataTables.filter((file) => !sources.includes(file) || linesOf(file) <= limitLines)).toEqual([])
})
