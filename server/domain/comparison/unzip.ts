import { promisify } from 'node:util'
import { gunzip } from 'node:zlib'

/** Gunzips beside the main thread. */
export const unzip = promisify<Buffer, Buffer>(gunzip)
