import { simulateStudy } from '../../server/domain/demo/injections'
import { ionsOf } from '../../server/domain/demo/ions'
import type { DemoStudy } from '../../server/domain/demo/studies'
import { align } from '../../shared/science/alignment/align'
import { alignmentDefaults } from '../../shared/science/alignment/settings'
import { decideVerdicts } from '../../shared/science/verdict/decideVerdicts'
import { estimateFloor } from '../../shared/science/verdict/estimateFloor'
import { REASONS } from '../../shared/science/verdict/reasons'
import { comparisonDefaults } from '../../shared/science/verdict/settings'
import { summariseSides } from '../../shared/science/verdict/summariseSides'
import { VERDICTS } from '../../shared/science/verdict/verdicts'

/** A demo study run through alignment and comparison at default settings, without a laboratory. */
export function judgeDemoStudy(study: DemoStudy) {
  const tables = simulateStudy(study)
  const aligned = align(tables.map(({ mz, retentionMinutes, intensity }, i) => ({
    digest: `table ${String(i).padStart(2, '0')}`,
    blank: study.sheet[i]?.kind.endsWith('Blank') ?? false,
    runOrder: study.sheet[i]?.runOrder ?? null,
    mz: Float64Array.from(mz), retentionMinutes: Float64Array.from(retentionMinutes), intensity: Float64Array.from(intensity),
  })), alignmentDefaults)
  const summary = summariseSides({
    samples: study.sheet.map((sample, i) => ({ ...sample, id: sample.name, floor: estimateFloor(tables[i]?.intensity ?? []), floorSource: 'estimated', gapFilled: false, measure: 'area' })),
    intensity: tables.map((table, i) => Float64Array.from(aligned.members[i] ?? [], row => table.intensity[row] ?? Number.NaN)),
    mz: aligned.mz,
    retentionMinutes: aligned.retentionMinutes,
    neighbourStart: aligned.neighbourStart,
    neighbourList: aligned.neighbourList,
    normaliseByAmount: true,
  })
  const result = decideVerdicts(summary, { ...comparisonDefaults, divertWindows: study.method.divertWindows })
  const ions = ionsOf(study.compounds)

  /** The aligned features at the main ion of a compound, near its true time; the true drift is under 0.2 min. */
  const featuresOf = (name: string) => {
    const ion = ions.find(({ compound }) => study.compounds[compound]?.name === name)
    if (!ion) throw new Error(`${study.seed} has no ${name}`)
    return [...aligned.mz].flatMap((mz, i) => Math.abs(mz - ion.mz) / ion.mz < 8e-6 && Math.abs((aligned.retentionMinutes[i] ?? 0) - ion.retentionMinutes) < 0.2
      ? [{
          index: i,
          mz,
          minutes: aligned.retentionMinutes[i] ?? Number.NaN,
          tables: aligned.groupSize[i] ?? 0,
          verdict: VERDICTS[result.columns.verdict[i] ?? 0],
          reason: REASONS[result.columns.reason[i] ?? 0],
          log2Ratio: result.columns.log2Ratio[i] ?? Number.NaN,
          reach: result.columns.reach[i] ?? Number.NaN,
        }]
      : [])
  }
  return { tables, aligned, result, featuresOf }
}
