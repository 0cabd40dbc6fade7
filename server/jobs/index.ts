import { align } from './align'
import { compare } from './compare'
import type { AnyJobKind } from './kind'
import { read } from './read'
import { trace } from './trace'

/** Every kind of job by its name. One file a kind in this folder. */
export const jobKinds: Record<string, AnyJobKind> = { align, compare, read, trace }
