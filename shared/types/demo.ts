/** How far the making of the demo laboratory is. */
export interface DemoState {
  making: boolean
  /** What is being done, as a phrase. */
  now: string
  /** Why it ended before it was whole, as a sentence. */
  problem: string | null
  /** Names of the tables under /demo/ to try an upload with, the sample sheet first; and of raw data. */
  files: string[]
  traceFiles: string[]
}
