import { describe, expect, it } from 'vitest'
import { commonPhrases } from '../../../server/domain/session/commonPasswords'
import { checkPassword, passwordProblem } from '../../../server/domain/session/passwordRules'

describe('passwords that are tried first', () => {
  it.each([
    'aaaaaaaaaaaa', 'abababababab', 'abcabcabcabc', '123412341234', 'purplepurple',
    '123456789012', '0987654321098', 'abcdefghijkl', 'zyxwvutsrqponm', 'qwertyuiop[]', 'poiuytrewq[]', 'qwerty123456', '1q2w3e4r5t6y', '1qaz2wsx3edc',
    'abcd1234efgh', '111111222222', 'qwertzuiop123', 'azertyuiop123',
    'password1234', 'Password1234!', 'P@ssw0rd1234', 'passwordpassword', 'welcome2026!!', 'changeme1234', 'letmein12345', 'iloveyou1234', 'administrator',
    'steelyard2026', 'Steelyard1234!', 'steelyardlab1', 'St33lyard!!!!', 'laboratory123', 'This is my password', 'correct horse battery staple', 'To be or not to be',
  ])('%s is refused', (password) => {
    expect(passwordProblem(password, 'quillon')).toMatch(/three or four words/)
  })

  it('include the sign-in name with little beside it', () => {
    expect(passwordProblem('annabel12345', 'annabel')).toContain('sign-in name')
    expect(passwordProblem('ANNABEL-2026!', 'annabel')).toContain('sign-in name')
    expect(passwordProblem('annabelannabel', 'annabel')).toMatch(/pattern|sign-in name/)
    expect(passwordProblem('annabel.gray99', 'annabel.gray@lab.example')).toContain('sign-in name')
    expect(passwordProblem('(a+b)[c]12345', '(a+b)[c]')).toContain('sign-in name')
  })

  it('hold every phrase of the list, with spaces or signs too', () => {
    for (const phrase of commonPhrases) {
      expect(passwordProblem(phrase, 'quillon'), phrase).not.toBeNull()
      expect(passwordProblem(`${phrase.slice(0, 4).toUpperCase()}-${phrase.slice(4)}!`, 'quillon'), phrase).not.toBeNull()
    }
  })
})

describe('anything else', () => {
  it.each([
    'apples on two pans', 'tangle ferry cobalt', 'annabel keeps three goats', 'chocolate coffee banana cheese', 'x9#Lk2!vQ7pZ', '193857205731', 'ﬁsh & χηµεία 12', 'пароль из трёх слов',
    '🐟🐠🐡🦈🐙🐚🦀🦞🦐🦑🐳🐬', 'password for the mass balance', 'steelyard weighs unlike things',
  ])('%s may be used', (password) => {
    expect(passwordProblem(password, 'annabel')).toBeNull()
  })

  it('may hold a short sign-in name', () => {
    expect(passwordProblem('banana hammock fleet', 'an')).toBeNull()
  })
})

describe('checkPassword', () => {
  it('names the field', () => {
    expect(() => checkPassword('password1234', 'ada')).toThrow(expect.objectContaining({ kind: 'invalid', issues: [expect.objectContaining({ field: 'password' })] }))
  })
})
