import { z } from 'zod'
import { roles } from '../permissions/roles'
import { requiredText } from './fields'

/** Any character is welcome; length is what protects. The commonest passwords are refused on the server. */
export const passwordSchema = z.string({ error: 'Please type a password.' }).min(12, 'At least 12 characters.').max(200, 'At most 200 characters.')

export const signInSchema = z.object({ signInName: requiredText(120), password: z.string().min(1, 'Please type your password.').max(200) })
export type SignInInput = z.infer<typeof signInSchema>

const signInName = z.string().trim().toLowerCase().min(2, 'At least 2 characters.').max(60, 'At most 60 characters.').regex(/^[\p{L}\p{N}._@+-]+$/u, 'Letters, digits and . _ @ + - only.')

export const personSchema = z.object({
  name: requiredText(120),
  signInName,
  email: z.union([z.literal(''), z.email('Not an e-mail address.')]).default(''),
  roles: z.array(z.enum(roles)).min(1, 'Choose at least one role.'),
})
export type PersonInput = z.infer<typeof personSchema>
