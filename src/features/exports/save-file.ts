/** Lets the browser fetch and save a file from an address of ours, under a name. */
export function saveFile(address: string, name: string): void {
  const link = document.createElement('a')
  link.href = address
  link.download = name
  document.body.append(link)
  link.click()
  link.remove()
}
