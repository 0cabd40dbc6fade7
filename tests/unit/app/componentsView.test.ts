import { describe, expect, it } from 'vitest'
import { viewFields } from '../../../app/utils/benchView'
import { changePair, readGroups, readPair, readPresent, writeGroups } from '../../../app/utils/componentsView'
import { formatScore } from '../../../app/utils/formatStatistics'

describe('the choices of principal components in the address', () => {
  it.each(['', '1', '1.1', '0.2', '1.6', '6.1', '1.2.3', '01.2', 'a.b', '-1.2'])('takes "%s" for no pair', (text) => {
    expect(readPair(text)).toBeUndefined()
  })

  it('reads what it wrote, and nothing else', () => {
    expect(readPair('3.1')).toEqual({ across: 3, upwards: 1 })
    expect(readGroups(writeGroups([]))).toEqual([])
    expect(readGroups('blank.pooledQc.bottle')).toEqual(['pooledQc', 'blank'])
    expect(readGroups('bottle')).toBeUndefined()
    expect(viewFields.componentScaling.read('cubic')).toBeUndefined()
    expect(readPresent('both')).toBe('bothSides')
    expect(readPresent('neither')).toBeUndefined()
  })

  it('lets the two change places rather than be the same', () => {
    expect(changePair({ across: 1, upwards: 2 }, 'across', 2)).toEqual({ across: 2, upwards: 1 })
    expect(changePair({ across: 1, upwards: 2 }, 'upwards', 1)).toEqual({ across: 2, upwards: 1 })
    expect(changePair({ across: 1, upwards: 2 }, 'across', 4)).toEqual({ across: 4, upwards: 2 })
  })
})

describe('a score', () => {
  it.each([[12.345, '+12.3'], [-0.03123, '−0.0312'], [0, '0'], [Number.NaN, '–'], [undefined, '–'], [1234.5, '+1230']])('%s stands as %s', (value, text) => {
    expect(formatScore(value)).toBe(text)
  })
})
