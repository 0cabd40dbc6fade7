import { describe, expect, it } from 'vitest'
import { addressWithoutSecret, secretInAddress } from '../../../server/utils/secretAddress'

describe('addresses in a log', () => {
  it.each([
    ['/shared/abc-_123', '/shared/…', 'abc-_123'],
    ['/shared/abc?verdict=level', '/shared/…', 'abc'],
    ['/api/shared/abc/data?x=abc', '/api/shared/…/data', 'abc'],
    ['/INVITATION/abc', '/INVITATION/…', 'abc'],
    ['/api/invitations/abc', '/api/invitations/…', 'abc'],
  ])('%s is written as %s', (path, written, secret) => {
    expect(addressWithoutSecret(path)).toBe(written)
    expect(secretInAddress(path)).toBe(secret)
  })

  it('hold no secret elsewhere', () => {
    expect(secretInAddress('/studies/shared/abc')).toBeUndefined()
    expect(secretInAddress('/api/studies/abc/share-links')).toBeUndefined()
    expect(secretInAddress('/shared')).toBeUndefined()
    expect(addressWithoutSecret('/studies/abc?verdict=level')).toBe('/studies/abc')
  })
})
