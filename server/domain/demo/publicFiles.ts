import { writeSheet } from '../../../shared/formats/sampleSheet/writeSheet'
import { exportFiles, fileNameOf, type DemoFile } from './exportFiles'
import { runFileName, runFiles } from './runFiles'
import { demoStudies } from './studies'

const README = `Files to try an upload with
===========================

All of it is invented; the juices and their makers do not exist.

sample-sheet.csv   the sample sheet: open it in a spreadsheet, copy all of it, and paste it into the sheet of a new study
the other *.csv    one feature table a file: drop all of them at once on the study's page for tables
*.mzML             raw data of three of the injections: drop them on the study's page for traces

Millrace-1 to -3      three bottles of a cloudy pressed apple juice: side A
Tallow-Lane-1 to -3   three cartons of a heated apple juice: side B
Blank-…               a solvent blank, and a process blank that went through the work-up without juice
QC-1 to -6            the pool of all six samples, injected between them
Standard-1 and -2     a mixture of standards

Each table is one injection in negative mode: m/z, retention time in minutes, peak area.
`

const [study] = demoStudies
const SHEET_NAME = 'sample-sheet.csv'
/** Samples whose raw data are offered too. */
const TRACED = ['Blank-process', 'Millrace-1', 'Tallow-Lane-1']

/** What lies in public/demo: the first study's tables, its sample sheet, raw data of a few of its samples, and a word on them. */
export function publicDemoFiles(): DemoFile[] {
  return [
    ...exportFiles(study),
    ...runFiles(study, TRACED),
    { name: SHEET_NAME, text: writeSheet(study.sheet) },
    { name: 'README.txt', text: README },
  ]
}

/** Names of the raw data to upload. */
export const publicTraceNames: string[] = TRACED.map(runFileName)

/** Names of the tables to upload, without the README: the sample sheet first. */
export const publicFileNames: string[] = [SHEET_NAME, ...study.sheet.map(sample => fileNameOf(sample.name))]
