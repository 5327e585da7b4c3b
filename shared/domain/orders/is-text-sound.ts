/**
 * Whether a signed text was checked and is that of its record, so that a figure may be shown that is said to be from it:
 * nothing is wrong, or only what is stored beside it.
 */
export const isTextSound = (fault: { what: string } | null): boolean =>
  fault === null || fault.what === 'entries'
