/** Features a block: two hundred samples of it stay in the processor's near memory. */
const BLOCK = 512

/**
 * Every sample against every other: sums over features of the product of their values. Blockwise, two samples against two at a
 * time, since a plain product of 100 × 50,000 spends most of its time fetching.
 *
 * @param values samples × features, sample after sample; not changed
 * @param onBlock told the share that is done, 0 to 1
 * @returns samples × samples, symmetric
 */
export function gramMatrix(values: Float64Array, samples: number, features: number, onBlock: (share: number) => void = () => {}): Float64Array {
  const gram = new Float64Array(samples * samples)
  for (let from = 0; from < features; from += BLOCK) {
    const to = Math.min(features, from + BLOCK)
    for (let i = 0; i < samples; i += 2) {
      // The last of an odd number is paired with itself; what is then written twice is the same.
      const nextI = Math.min(i + 1, samples - 1)
      for (let j = i; j < samples; j += 2) addBlock(gram, values, samples, features, i, nextI, j, Math.min(j + 1, samples - 1), from, to)
    }
    onBlock(to / features)
  }
  for (let i = 0; i < samples; i++) for (let j = 0; j < i; j++) gram[i * samples + j] = gram[j * samples + i]!
  return gram
}

function addBlock(gram: Float64Array, values: Float64Array, samples: number, features: number, i: number, nextI: number, j: number, nextJ: number, from: number, to: number): void {
  let both = 0
  let firstNext = 0
  let nextFirst = 0
  let bothNext = 0
  const rowI = i * features
  const rowNextI = nextI * features
  const rowJ = j * features
  const rowNextJ = nextJ * features
  for (let k = from; k < to; k++) {
    const a = values[rowI + k]!
    const b = values[rowNextI + k]!
    const c = values[rowJ + k]!
    const d = values[rowNextJ + k]!
    both += a * c
    firstNext += a * d
    nextFirst += b * c
    bothNext += b * d
  }
  gram[i * samples + j]! += both
  if (nextJ !== j) gram[i * samples + nextJ]! += firstNext
  if (nextI === i) return
  // Below the diagonal is filled in at the end.
  if (nextI <= j) gram[nextI * samples + j]! += nextFirst
  if (nextJ !== j) gram[nextI * samples + nextJ]! += bothNext
}
