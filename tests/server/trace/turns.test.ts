import { describe, expect, it } from 'vitest'
import { TooManyError } from '../../../server/domain/DomainError'
import { Turns } from '../../../server/domain/trace/turns'

/** Work that ends when it is told to; `began` names what has begun, in order. */
function works() {
  const began: string[] = []
  const ends = new Map<string, () => void>()
  const work = (name: string) => () => {
    began.push(name)
    return new Promise<string>(resolve => ends.set(name, () => resolve(name)))
  }
  return { began, work, end: (name: string) => ends.get(name)?.() }
}
const settled = () => new Promise(resolve => setImmediate(resolve))
const wanted = () => true

describe('turns', () => {
  it('let one work of each asker run at once, and only so many in all', async () => {
    const { began, work, end } = works()
    const turns = new Turns(2, 10)
    const all = ['a1', 'a2', 'a3', 'b1', 'c1'].map(name => turns.take(name.charAt(0), wanted, work(name)))
    await settled()
    expect(began).toEqual(['a1', 'b1'])
    end('a1')
    await settled()
    // c has not had a turn yet, a has.
    expect(began).toEqual(['a1', 'b1', 'c1'])
    end('b1')
    await settled()
    expect(began.at(-1)).toBe('a2')
    for (const name of ['c1', 'a2', 'a3']) {
      end(name)
      await settled()
    }
    expect(await Promise.all(all)).toEqual(['a1', 'a2', 'a3', 'b1', 'c1'])
  })

  it('let several of one asker run where they may', async () => {
    const { began, work, end } = works()
    const turns = new Turns(Number.POSITIVE_INFINITY, 10, 2)
    const all = ['a1', 'a2', 'a3', 'b1'].map(name => turns.take(name.charAt(0), wanted, work(name)))
    await settled()
    expect(began).toEqual(['a1', 'a2', 'b1'])
    end('a2')
    await settled()
    expect(began.at(-1)).toBe('a3')
    for (const name of ['a1', 'a3', 'b1']) end(name)
    expect(await Promise.all(all)).toEqual(['a1', 'a2', 'a3', 'b1'])
  })

  it('pass by what nobody waits for any more, and go on after work that fails', async () => {
    const { began, work, end } = works()
    const turns = new Turns(1, 10)
    const failed = turns.take('a', wanted, () => Promise.reject(new Error('no disk')))
    const left = turns.take('a', () => false, work('left'))
    const last = turns.take('a', wanted, work('last'))
    await expect(failed).rejects.toThrow('no disk')
    expect(await left).toBeNull()
    await settled()
    end('last')
    expect(await last).toBe('last')
    expect(began).toEqual(['last'])
  })

  it('refuse an asker whose requests pile up, and nobody else', async () => {
    const { work, end } = works()
    const turns = new Turns(1, 2)
    const all = ['a1', 'a2', 'a3'].map(name => turns.take('a', wanted, work(name)))
    await expect(turns.take('a', wanted, work('a4'))).rejects.toThrow(TooManyError)
    const other = turns.take('b', wanted, work('b1'))
    for (const name of ['a1', 'b1', 'a2', 'a3']) {
      await settled()
      end(name)
    }
    expect(await Promise.all([...all, other])).toEqual(['a1', 'a2', 'a3', 'b1'])
  })
})
