/** Hands a person a file that the page has made. */
export function saveFile(name: string, file: Blob): void {
  const address = URL.createObjectURL(file)
  const link = Object.assign(document.createElement('a'), { href: address, download: name })
  link.click()
  // The browser reads the address in its own time.
  setTimeout(() => URL.revokeObjectURL(address), 60_000)
}
