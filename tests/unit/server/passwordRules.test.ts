import { describe, expect, it } from 'vitest'
import { assertGoodPassword } from '../../../server/services/passwordRules.ts'

const about = ['matilda.oakes@longbank.example', 'Matilda Oakes', 'Long Bank']
const refusal = (password: string): string | null => {
  try {
    assertGoodPassword(password, { own: about })
    return null
  } catch (error) {
    return (error as { errors: { code: string }[] }).errors[0]?.code ?? ''
  }
}

describe('a new password', () => {
  it.each(['Matilda-Oakes-1', 'longbank2026!', 'drenchleaf 9876', 'MATILDAmatilda', 'owner-password', 'register 2026', 'contraseña-1'])('%s has little in it but names that others know', (password) => {
    expect(refusal(password)).toBe('welcome.password_known')
  })

  it.each(['Matilda walks at dawn', 'wet leaves at dawn', '🌱🌿🍃🌾🌳🌲🍀🌵🌴🌻🌼🌷', '            ', 'p'.repeat(256)])('%j is taken as it is', (password) => {
    expect(refusal(password)).toBeNull()
  })

  it('has twelve characters, counted as people count', () => {
    expect(refusal('elevensigns')).toBe('welcome.password_short')
    expect(refusal('🌱'.repeat(11))).toBe('welcome.password_short')
    expect(refusal('qwertyuiop123')).not.toBe('welcome.password_short')
  })
})
