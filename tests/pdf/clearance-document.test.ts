import { beforeAll, describe, expect, it } from 'vitest'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { clearanceLike, signedBlock } from './examples/clearance-like.ts'
import { infoOf, nfkc, pageCount, pageTexts, textOf } from './support/poppler.ts'

const flat = (text: string) => nfkc(text).replaceAll(/\s+/g, ' ')

let bytes: Uint8Array
beforeAll(async () => void (bytes = await drawDocument(clearanceLike())))

describe('a clearance certificate', () => {
  it('gives back what was signed, in reading order', () => {
    const text = flat(textOf(bytes))
    const inOrder = [
      'Harrow Point Sea Hall',
      'Clearance certificate',
      'Q-115. Days are calendar dates of the facility (America/Halifax).',
      'Signed by Dr Ilse Marrow, 14 May 2026, 15:24:07, UTC−3',
      'Kelp hall wrasse, second shipment',
      '39 to 45 animals, estimated',
      'Cleared from quarantine on 14 May 2026',
      'Marine fish under copper (QP-30, version 2)',
      'Day 0 14 Apr 2026',
      '30 days ran, 30 wanted',
      'Paused 2 days',
      'Q-113, Q-116',
      'HP-0611 Corkwing wrasse Symphodus melops 38 to 44, estimated QT-3 12 Apr 2026',
      'HP-0612 Ballan wrasse, Old Tom Labrus bergylta 1 QT-3 14 Apr 2026',
      'HP-0613 Goldsinny wrasse Ctenolabrus rupestris none left 14 Apr 2026',
      'Not met at clearance',
      '30 days plus what was paused: until 16 May 2026, 2 days to run.',
      'Cleared all the same by Dr Ilse Marrow, reason: The wing is closed for repair on Friday;',
      'Two clean wet mounts: 1 of 2.',
      'Two clean wet mounts not met, 1 of 2',
      'Feeding on its own met on 2 May 2026',
      'Entry 2: wet rock from QT-1 on 20 Apr 2026 changes nothing. (no longer counts)',
      '21 Apr 2026 HP-0613 2 explained, not transmissible: caught in the outflow screen',
      '25 Apr 2026 not known 1 unexplained',
      'licence VL-20417, valid to 30 Sep 2026, Harrow County',
      'Signed as author of this clearance, 14 May 2026, 15:24:07,',
      'The text matches what was signed',
      '7c1e40af92d30b15'.repeat(4),
      'It is no permit, health certificate or leave to ship',
    ].map(flat)
    let from = 0
    for (const part of inOrder) {
      const at = text.indexOf(part, from)
      expect(at, `"${part}" after "${text.slice(Math.max(0, from - 60), from)}"`).toBeGreaterThanOrEqual(0)
      from = at + part.length
    }
    expect(text).not.toContain('not confirmed')
  })

  it('goes on over several pages, each with its record check and number, and Letter where it is wanted', async () => {
    const long = await drawDocument(clearanceLike({ paper: 'letter' }, 90))
    const pages = pageCount(long)
    expect(pages).toBeGreaterThanOrEqual(3)
    expect(infoOf(long)).toMatchObject({
      Title: 'Clearance certificate Q-115',
      'Page size': '612 x 792 pts (letter)',
    })
    for (const [i, text] of pageTexts(long).entries()) {
      expect(text).toContain('Record check 7C1E 40AF 92D3 0B15')
      expect(text).toContain(`Page ${i + 1} of ${pages}`)
    }
    const entries = [...textOf(long).matchAll(/Entry (\d+):/g)].map((match) => Number(match[1]))
    expect(entries).toEqual(Array.from({ length: 90 }, (_, i) => i + 1))
  })

  it.each([
    ['broken', false, 'Record check failed'],
    ['unknown-key', false, 'a key that this installation does not know'],
    ['intact', true, 'Recalled after clearance: void.'],
  ] as const)('does not say that it holds when it is %s, recalled %s', async (state, recalled, notice) => {
    const text = flat(textOf(await drawDocument(clearanceLike({ recalled, block: signedBlock(state) }))))
    expect(text).toContain(notice)
    expect(text).toContain('This certificate does not hold')
    expect(text).not.toContain('Cleared from quarantine on')
  })
})
