import { setMessageLocale } from '../../shared/messages/define-messages.ts'

const kept = 'pratique.words'

/**
 * Longer or right-to-left words in place of English, for whoever builds or tests with them. No production bundle has it.
 */
export function startMessageLocale(): void {
  const locale = localStorage.getItem(kept)
  if (locale === 'pseudo' || locale === 'pseudo-rtl') setMessageLocale(locale)
}
