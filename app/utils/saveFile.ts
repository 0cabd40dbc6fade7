/** Hands a person a file that the page has made. */
export function saveFile(name: string, text: string, type: string): void {
  const address = URL.createObjectURL(new Blob([text], { type }))
  const link = Object.assign(document.createElement('a'), { href: address, download: name })
  link.click()
  // The browser reads the address in its own time.
  setTimeout(() => URL.revokeObjectURL(address), 60_000)
}
