/** The fate of an urgent call. */
export type NoticeFate = 'sending' | 'not-sent' | 'sent' | 'seen'

/**
 * What has become of an urgent call, by what its ledgers hold. Sent to one is sent; seen by one is seen. Not sent means
 * that attempts were made and none reached anybody; the queue goes on trying.
 */
export function noticeState(counts: { seen: number; sent: number; failed: number }): NoticeFate {
  if (counts.seen > 0) return 'seen'
  if (counts.sent > 0) return 'sent'
  return counts.failed > 0 ? 'not-sent' : 'sending'
}
