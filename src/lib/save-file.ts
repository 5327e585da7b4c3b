/** Hands a file to the browser, which keeps it where the person keeps what they download. */
export function saveFile(blob: Blob, name: string): void {
  const address = URL.createObjectURL(blob)
  const link = document.createElement('a')
  link.href = address
  link.download = name
  link.click()
  // the download has taken the file over by then; held for ever it would fill the memory of a page that stays open
  setTimeout(() => URL.revokeObjectURL(address), 60_000)
}
