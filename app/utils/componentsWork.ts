import type { SampleComponents, SampleComponentsInput } from '#shared/science/components/sampleComponents'

/** What components are computed of: `samples` and `features` are places in the comparison's data. */
export interface ComponentsAsk extends Pick<SampleComponentsInput, 'factors' | 'features' | 'scaling' | 'most'> {
  samples: readonly number[]
}

/** Sent to the worker; the intensities of all samples once, then null. */
export interface ComponentsWork { run: number, ask: ComponentsAsk, intensity: readonly Float64Array[] | null }

/** Sent back: how far a run has come, or what it found. */
export type ComponentsReport = { run: number, share: number, what: string } | { run: number, result: SampleComponents }
