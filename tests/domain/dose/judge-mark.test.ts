import { describe, expect, it } from 'vitest'
import { judgeMark } from '../../../shared/domain/dose/judge-mark.ts'
import type { MarksOnFile } from '../../../shared/domain/dose/judge-mark.ts'
import { q } from '../../builders/baths.ts'

const tank: MarksOnFile = { depths: [q('0.68', 'm')], fillMark: null }
const tub: MarksOnFile = { depths: [], fillMark: { mark: 'red line', volume: q('60', 'L') } }
const allowed = 5

describe('the mark that a second person saw', () => {
  it.each([
    // 5 % of 0.68 m is 3.4 cm either way
    ['0.68 m', 'agrees'],
    ['68 cm', 'agrees'],
    ['depth 71.4cm', 'agrees'],
    ['64.6 cm', 'agrees'],
    ['71.5 cm', 'differs'],
    ['26.8 in', 'agrees'],
    ['6.8 m', 'differs'],
    ['0.40 m', 'differs'],
    ['0.68', 'unreadable'],
    ['at the line', 'unreadable'],
    ['68 L', 'unreadable'],
    ['1 0.68 m', 'unreadable'],
    ['-0.68 m', 'unreadable'],
    ['0.68 m or 6.8 m', 'unreadable'],
    ['not at 0.68 m', 'unreadable'],
  ])('%s in water 0.68 m deep: %s', (read, judgement) => {
    expect(judgeMark(read, tank, allowed)).toBe(judgement)
  })

  it('is allowed a centimetre where the drift allows less', () => {
    expect(judgeMark('11 cm', { depths: [q('10', 'cm')], fillMark: null }, allowed)).toBe('agrees')
    expect(judgeMark('11.1 cm', { depths: [q('10', 'cm')], fillMark: null }, allowed)).toBe('differs')
  })

  it('is any of the tanks that share the water', () => {
    const two = { depths: [q('0.68', 'm'), q('1.2', 'm')], fillMark: null }
    expect(judgeMark('1.2 m', two, allowed)).toBe('agrees')
    expect(judgeMark('0.9 m', two, allowed)).toBe('differs')
  })

  it.each([
    ['Red  line', 'agrees'],
    ['at the red line', 'agrees'],
    ['60 L', 'agrees'],
    ['60000 mL', 'agrees'],
    ['blue line', 'differs'],
    ['80 L', 'differs'],
    ['not the red line: filled to 20 L only', 'differs'],
    ['5 cm over the red line', 'differs'],
    ['filled to the red line', 'agrees'],
  ])('%s on a tub filled to the red line, 60 L: %s', (read, judgement) => {
    expect(judgeMark(read, tub, allowed)).toBe(judgement)
  })

  it.each([
    ['20 L mark', 'agrees'],
    ['120 L mark', 'differs'],
    ['20 L', 'agrees'],
  ])('%s on a tub whose mark is called by its litres: %s', (read, judgement) => {
    const bucket = { depths: [], fillMark: { mark: '20 L mark', volume: q('20', 'L') } }
    expect(judgeMark(read, bucket, allowed)).toBe(judgement)
  })

  it('is not a word in which the letter of the mark happens to stand', () => {
    const lettered = { depths: [], fillMark: { mark: 'A', volume: q('20', 'L') } }
    expect(judgeMark('a', lettered, allowed)).toBe('agrees')
    expect(judgeMark('mark B at the wall', lettered, allowed)).toBe('differs')
  })

  it('is compared with nothing where nothing is on file, and that is said', () => {
    expect(judgeMark('0.68 m', { depths: [], fillMark: null }, allowed)).toBe('not-on-file')
  })
})
