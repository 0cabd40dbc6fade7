import { afterEach, describe, expect, it, vi } from 'vitest'
import { addressProblem, ownAddress, ownHosts } from '../../../server/utils/environment'

afterEach(() => vi.unstubAllEnvs())

describe('ownAddress', () => {
  it('is STEELYARD_URL where it is set, whatever the request says', () => {
    vi.stubEnv('STEELYARD_URL', 'https://steelyard.example/')
    expect(ownAddress('attacker.example')).toBe('https://steelyard.example')
    expect(ownHosts()).toContain('steelyard.example')
  })

  it('is the host of the request else, and this machine where there is no request', () => {
    vi.stubEnv('STEELYARD_URL', '')
    vi.stubEnv('PORT', '4104')
    expect(ownAddress('localhost:4104')).toBe('http://localhost:4104')
    expect(ownAddress()).toBe('http://127.0.0.1:4104')
    expect(ownHosts()).toEqual(['127.0.0.1', 'localhost', '[::1]'])
  })
})

describe('addressProblem', () => {
  it('says how to be reached when the server listens for others without an address', () => {
    expect(addressProblem({ STEELYARD_HOST: '0.0.0.0' }).notice).toContain('Set STEELYARD_URL')
    expect(addressProblem({ STEELYARD_HOST: '0.0.0.0', STEELYARD_URL: 'http://lab-server:3000' })).toEqual({})
    expect(addressProblem({ STEELYARD_HOST: '127.0.0.1' })).toEqual({})
    expect(addressProblem({})).toEqual({})
  })

  it('stops at what is no address', () => {
    expect(addressProblem({ STEELYARD_URL: 'lab-server:3000' }).stop).toContain('http://')
    expect(addressProblem({ STEELYARD_URL: 'lab server' }).stop).toContain('no address')
  })
})
