import { config } from 'zod/v4/core'

// The content policy allows no code made at run time. Zod would try whether it may, and every page would report it;
// so it is told before any page's schema is made.
config({ jitless: true })

export default defineNuxtPlugin(() => {})
