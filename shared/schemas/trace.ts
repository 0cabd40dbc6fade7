import { z } from 'zod'
import { idField } from './fields'
import { uploadQuerySchema } from './table'

/** Bytes an mzML file may have. */
export const MAX_TRACE_BYTES = 2 ** 30
/** Counts below which points of raw data are not kept, unless a person says more: all that are above nought. */
export const DEFAULT_INTENSITY_LIMIT = 0

/** The address's query of an mzML upload: the file's name, the trace it is to replace, and the intensity from which its points are kept. */
export const traceUploadQuerySchema = uploadQuerySchema.extend({
  intensityLimit: z.coerce.number({ error: 'Please give a number.' }).min(0, 'Must be 0 or greater.').max(1e12).default(DEFAULT_INTENSITY_LIMIT),
})
export type TraceUploadQuery = z.infer<typeof traceUploadQuerySchema>

/** What may be changed of a trace: the sample it belongs to. */
export const traceChangeSchema = z.object({ sampleId: idField.nullable() })
export type TraceChange = z.infer<typeof traceChangeSchema>
