export type JobStatus = 'queued' | 'running' | 'done' | 'failed' | 'cancelled'
