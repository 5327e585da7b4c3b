/** Whether the person is typing, so that single-letter keys must not act. */
export function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false
  if (target.isContentEditable) return true
  if (target instanceof HTMLInputElement) {
    return !['button', 'checkbox', 'radio', 'submit', 'reset', 'range', 'file'].includes(target.type)
  }
  return target instanceof HTMLTextAreaElement || target instanceof HTMLSelectElement
}

/** A single-letter key press that may act: no modifier, nobody typing, no dialog in front. */
export function isSingleKey(event: KeyboardEvent): boolean {
  return (
    !event.ctrlKey &&
    !event.metaKey &&
    !event.altKey &&
    !event.defaultPrevented &&
    !event.isComposing &&
    !isTyping(event.target) &&
    document.querySelector('dialog[open]') === null
  )
}
