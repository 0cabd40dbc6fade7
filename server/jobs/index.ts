import { align } from './align'
import { compare } from './compare'
import type { JobKind } from './kind'
import { read } from './read'

// eslint-disable-next-line @typescript-eslint/no-explicit-any
type AnyKind = JobKind<any, any>

/** Every kind of job by its name. One file a kind in this folder. */
export const jobKinds: Record<string, AnyKind> = { align, compare, read }
