import type { SampleInput } from '../../../shared/schemas/sample'

const plain: Omit<SampleInput, 'name' | 'kind' | 'runOrder'> = {
  side: null, preparation: '', amount: null, amountUnit: 'mg', volumeMl: null, dilution: null, injectionUl: 5, batch: '',
}

type Weighed = readonly [name: string, side: 'A' | 'B', amountMg: number, volumeMl: number, dilution: number, injectionUl: number]
const weighed = ([name, side, amount, volumeMl, dilution, injectionUl]: Weighed, preparation: string): Omit<SampleInput, 'runOrder'> =>
  ({ ...plain, name, kind: 'sample', side, preparation, amount, volumeMl, dilution, injectionUl })
const other = (name: string, kind: SampleInput['kind']): Omit<SampleInput, 'runOrder'> => ({ ...plain, name, kind })

/** In the order of injection, which is also the order of the sheet. */
const inRunOrder = (rows: Omit<SampleInput, 'runOrder'>[], batch: string): SampleInput[] =>
  rows.map((row, index) => ({ ...row, runOrder: index + 1, batch }))

/** Two juices, three bottles each, taken to different volumes and dilutions, between pooled QCs. */
export const juiceSheet = inRunOrder([
  other('Blank-solvent', 'solventBlank'),
  other('Blank-process', 'processBlank'),
  other('QC-1', 'pooledQc'),
  other('QC-2', 'pooledQc'),
  other('Standard-1', 'standard'),
  weighed(['Millrace-1', 'A', 1012, 10, 2, 5], 'bottle M1'),
  weighed(['Tallow-Lane-1', 'B', 2015, 10, 5, 5], 'bottle T1'),
  other('QC-3', 'pooledQc'),
  weighed(['Tallow-Lane-2', 'B', 1986, 10, 5, 5], 'bottle T2'),
  weighed(['Millrace-2', 'A', 987, 10, 2, 5], 'bottle M2'),
  other('QC-4', 'pooledQc'),
  weighed(['Millrace-3', 'A', 1534, 20, 2, 5], 'bottle M3'),
  weighed(['Tallow-Lane-3', 'B', 2043, 10, 5, 4], 'bottle T3'),
  other('QC-5', 'pooledQc'),
  other('Standard-2', 'standard'),
  other('QC-6', 'pooledQc'),
], 'run 1')

/** Two months later: one bottle of each, another batch of the carton. */
export const laterJuiceSheet = inRunOrder([
  other('Blank-process-2', 'processBlank'),
  weighed(['Millrace-4', 'A', 1004, 10, 2, 5], 'bottle M4'),
  weighed(['Tallow-Lane-4', 'B', 1978, 10, 5, 5], 'bottle T4'),
], 'run 2')

/** Peel of oranges from a grove and from a market stall, three preparations each. */
export const peelSheet = inRunOrder([
  other('Peel-blank', 'processBlank'),
  weighed(['Grove-1', 'A', 502, 10, 1, 5], 'peel G1'),
  weighed(['Market-1', 'B', 497, 10, 1, 5], 'peel K1'),
  weighed(['Grove-2', 'A', 511, 10, 1, 5], 'peel G2'),
  weighed(['Market-2', 'B', 489, 10, 1, 5], 'peel K2'),
  weighed(['Market-3', 'B', 508, 10, 1, 5], 'peel K3'),
  weighed(['Grove-3', 'A', 494, 10, 1, 5], 'peel G3'),
], 'run 3')
