/** Bytes as people read them: 512 B, 3.4 kB, 64 MB. Powers of 1024, as the limits are. */
export function sizeOf(bytes: number): string {
  if (bytes < 1024) return `${bytes} B`
  const [value, unit] = bytes < 1024 ** 2 ? [bytes / 1024, 'kB'] : [bytes / 1024 ** 2, 'MB']
  return `${value < 10 ? value.toFixed(1) : Math.round(value)} ${unit}`
}
