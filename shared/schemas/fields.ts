import { z } from 'zod'

/** Text a person types: trimmed, not empty. */
export const requiredText = (max = 200) => z.string().trim().min(1, 'Please fill this in.').max(max, `At most ${max} characters.`)
export const optionalText = (max = 2000) => z.string().trim().max(max, `At most ${max} characters.`).default('')
export const positive = z.number({ error: 'Please give a number.' }).positive('Must be greater than 0.').max(1e12)
export const idField = z.string().regex(/^[\w-]{22}$/, 'Not an id.')
