import { z } from 'zod'
import { roles } from '../permissions/roles'
import { requiredText } from './fields'

export const PASSWORD_LENGTH = 12

/** Any character is welcome; length is what protects. The commonest passwords are refused on the server. */
export const passwordSchema = z.string({ error: 'Please type a password.' })
  .refine(password => [...password].length >= PASSWORD_LENGTH, `At least ${PASSWORD_LENGTH} characters.`)
  .max(200, 'At most 200 characters.')

const typedPassword = z.string({ error: 'Please type your password.' }).min(1, 'Please type your password.').max(200, 'At most 200 characters.')

/** Capitals do not matter in a sign-in name, nor how a letter with an accent was typed. */
const typedName = z.string({ error: 'Please fill this in.' }).trim().max(200, 'At most 200 characters.').transform(name => name.normalize('NFKC').toLowerCase())
const signInName = typedName.pipe(z.string().min(2, 'At least 2 characters.').max(60, 'At most 60 characters.').regex(/^[\p{L}\p{N}._@+-]+$/u, 'Letters, digits and . _ @ + - only.'))

export const signInSchema = z.object({ signInName: typedName.pipe(requiredText(120)), password: typedPassword })
export type SignInInput = z.infer<typeof signInSchema>

const account = {
  name: requiredText(120),
  email: z.union([z.literal(''), z.email('Not an e-mail address.')], { error: 'Not an e-mail address.' }).default(''),
  roles: z.array(z.enum(roles), { error: 'Choose at least one role.' }).min(1, 'Choose at least one role.'),
}
export const personSchema = z.object({ ...account, signInName })
export type PersonInput = z.infer<typeof personSchema>

/** What a lab lead may change of an account. */
export const personEditSchema = z.object(account)
export type PersonEdit = z.infer<typeof personEditSchema>

/** The page behind a one-time link. */
export const newPasswordSchema = z.object({ password: passwordSchema })

export const firstSchema = z.object({ code: requiredText(100), name: requiredText(120), signInName, password: passwordSchema })
export type FirstInput = z.infer<typeof firstSchema>

/** What a person changes of their own account; what is left out stays. */
export const profileSchema = z.object({ name: requiredText(120).optional(), benchKeys: z.boolean({ error: 'Yes or no.' }).optional() })
  .refine(profile => Object.values(profile).some(value => value !== undefined), 'Nothing to change.')
export type ProfileInput = z.infer<typeof profileSchema>

export const passwordChangeSchema = z.object({ present: typedPassword, password: passwordSchema })
export type PasswordChangeInput = z.infer<typeof passwordChangeSchema>
