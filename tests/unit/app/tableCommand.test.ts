import { describe, expect, it } from 'vitest'
import { headCommand, tableCommand } from '../../../app/utils/tableCommand'

const key = (name: string, how: Partial<Record<'ctrlKey' | 'metaKey' | 'altKey' | 'shiftKey', boolean>> = {}) => ({ key: name, ctrlKey: false, metaKey: false, altKey: false, shiftKey: false, ...how })

describe('keys of the feature table', () => {
  it.each([
    ['ArrowDown', {}, { does: 'move', by: 'row', way: 1, only: false, extend: false }],
    ['ArrowUp', { ctrlKey: true }, { does: 'move', by: 'row', way: -1, only: true, extend: false }],
    ['End', { shiftKey: true }, { does: 'move', by: 'edge', way: 1, only: false, extend: true }],
    ['PageUp', {}, { does: 'move', by: 'page', way: -1, only: false, extend: false }],
    [' ', {}, { does: 'pick' }], ['Enter', {}, { does: 'select' }], ['a', { metaKey: true }, { does: 'pickAll' }], ['Escape', {}, { does: 'letGo' }],
  ] as const)('%s %o', (name, how, command) => expect(tableCommand(key(name, how))).toEqual(command))

  it('leaves all other keys to the bench and the browser', () => {
    for (const pressed of [key('a'), key('c', { ctrlKey: true }), key('ArrowDown', { altKey: true }), key('j'), key('ArrowLeft')]) expect(tableCommand(pressed)).toBeUndefined()
  })
})

describe('keys of the head', () => {
  it.each([
    ['ArrowLeft', {}, { does: 'move', by: 'column', way: -1 }], ['Home', {}, { does: 'move', by: 'edge', way: -1 }],
    ['Enter', { shiftKey: true }, { does: 'sort', further: true }], [' ', {}, { does: 'sort', further: false }],
    ['ArrowDown', { altKey: true }, { does: 'menu' }], ['F10', { shiftKey: true }, { does: 'menu' }], ['ArrowDown', {}, { does: 'leave' }],
  ] as const)('%s %o', (name, how, command) => expect(headCommand(key(name, how))).toEqual(command))

  it('leaves all other keys alone', () => {
    for (const pressed of [key('m'), key('Enter', { ctrlKey: true }), key('PageDown')]) expect(headCommand(pressed)).toBeUndefined()
  })
})
