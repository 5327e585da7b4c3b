import { expect, it } from 'vitest'
import { projectFiles, projectText } from '../support/project-files.ts'

const files = projectFiles().filter((file) => /^(src|server|shared|tests)\//.test(file))

it('files and folders are named in kebab-case', () => {
  const part = /^\.?[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)*$/
  expect(files.filter((file) => !file.split('/').every((name) => part.test(name)))).toEqual([])
})

it('nothing is put away under a name that says nothing', () => {
  const sayNothing = /(^|\/)(utils?|common|helpers?|misc|types|constants-all)(\.tsx?|\.mjs|\/)/
  expect(files.filter((file) => sayNothing.test(file))).toEqual([])
})

it('every test file lies in a folder that vitest runs', () => {
  const configured = projectText('vite.config.ts')
  const tests = files.filter((file) => /\.test\.tsx?$/.test(file))
  expect(tests.length).toBeGreaterThan(3)
  const stray = tests.filter((file) => {
    const [top, folder, ...rest] = file.split('/')
    return top !== 'tests' || rest.length === 0 || !configured.includes(`'${folder}'`)
  })
  expect(stray).toEqual([])
})

it('every file in a tests folder that looks like a test is one', () => {
  const inSuites = files.filter((file) =>
    /^tests\/(?!support\/|builders\/|architecture\/canary\/).*\.tsx?$/.test(file),
  )
  const holdsTests = inSuites.filter((file) => /^(it|test|describe)(\.each)?\(/m.test(projectText(file)))
  expect(holdsTests.filter((file) => !/\.test\.tsx?$/.test(file))).toEqual([])
})
