import type { NoticeFate } from '../domain/notices/notice-state.ts'
import { defineMessages } from './define-messages.ts'

export const noticeStateWords = defineMessages({
  sending: 'Sending',
  'not-sent': 'Not sent',
  sent: 'Sent',
  seen: 'Seen',
} satisfies Record<NoticeFate, string>)

/** The letter that goes to whoever is on call. */
export const noticeLetter = defineMessages({
  subject: (p: { place: string }) => `URGENT: ${p.place}`,
  text: (p: { place: string; words: string; by: string; at: string; address: string }) =>
    `${p.place}\n\n${p.words}\n\nSeen by ${p.by}, ${p.at}.\n\nTelephone the person or the duty desk, then say in Pratique that you have seen this:\n${p.address}\n`,
  placeWithCase: (p: { enclosure: string; name: string; number: string }) =>
    `${p.enclosure} ${p.name}, ${p.number}`,
  nobodyListed: 'Nobody with an e-mail address stands on the on-call list.',
})
