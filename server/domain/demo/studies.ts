import type { FlagKind } from '../../../shared/schemas/flag'
import type { MethodInput } from '../../../shared/schemas/method'
import type { StudyInput } from '../../../shared/schemas/study'
import type { LayoutAnswers } from '../../../shared/science/table/layout'
import { negativeBackground } from './background'
import { appleCompounds, peelCompounds, type DemoCompound } from './compounds'
import type { SimulatedStudy } from './injections'
import { inventCompounds } from './invented'
import { laterBatch } from './laterBatch'
import { seededRandom } from './seededRandom'
import { juiceSheet, laterJuiceSheet, peelSheet } from './sheets'

export interface DemoStudy extends SimulatedStudy {
  method: MethodInput
  study: Omit<StudyInput, 'methodId'>
  /** How its tables are written: one file a sample in minutes or in seconds, or one wide file. */
  fileStyle: 'minutes' | 'seconds' | 'wide'
  comparisonTitle: string
  /** What the analyst answers where its files leave something open. */
  answers: LayoutAnswers
  /** Samples whose raw data are there too. */
  traced: readonly string[]
  /** What the scientist has flagged. */
  flags: readonly { compound: string, kind: FlagKind, reason: string }[]
}

const juiceMethod: MethodInput = {
  name: 'Phenolics, negative, 15 min',
  column: 'C18, 100 × 2.1 mm, 1.7 µm',
  gradient: 'water and acetonitrile, both with 0.1 % formic acid: 2 % to 95 % in 12 min, 0.35 mL/min, 40 °C',
  polarity: 'negative',
  voidMinutes: 0.65,
  divertWindows: [{ startMinutes: 0, endMinutes: 0.8 }],
  remark: 'Invented for the demo laboratory.',
}

const peelMethod: MethodInput = {
  ...juiceMethod,
  name: 'Residues, positive, 15 min',
  polarity: 'positive',
}

const juiceCompounds: readonly DemoCompound[] = [
  ...appleCompounds,
  ...negativeBackground,
  ...inventCompounds({ level: 235, between: 42, moreA: 27, moreB: 34, onlyA: 8, onlyB: 3, solvent: 16, process: 14, aboveBlankInA: 6 }, seededRandom('juices invented'), 'negative'),
]

/** The demo laboratory's studies, oldest first. */
export const demoStudies: readonly [DemoStudy, DemoStudy, DemoStudy] = [
  {
    seed: 'juices',
    polarity: 'negative',
    method: juiceMethod,
    study: {
      title: 'Pressed or carton: two apple juices',
      question: 'What does cloudy pressed juice from the Millrace orchard hold that the Tallow Lane carton lacks, and the other way round?',
      matrix: 'apple juice, centrifuged and diluted with water',
      sideAName: 'Millrace pressed',
      sideBName: 'Tallow Lane carton',
      restricted: false,
    },
    sheet: juiceSheet,
    compounds: juiceCompounds,
    calibratedAt: 9,
    overlooked: [{ compound: 'invented 344', side: 'B', share: 0.5 }, { compound: 'invented 342', side: 'B', share: 0.6 }, { compound: 'invented 348', side: 'A', share: 0.6 }],
    traced: ['Blank-solvent', 'Blank-process', 'QC-3', 'QC-4', 'Millrace-1', 'Millrace-2', 'Millrace-3', 'Tallow-Lane-1', 'Tallow-Lane-2', 'Tallow-Lane-3'],
    fileStyle: 'minutes',
    comparisonTitle: 'Millrace against Tallow Lane',
    answers: {},
    flags: [
      { compound: 'patulin', kind: 'askAgain', reason: 'm/z of patulin, but protocatechuic acid has the same and comes later. Mass alone cannot tell: run a standard.' },
      { compound: '5-hydroxymethylfurfural', kind: 'oneSideOnly', reason: 'Fits 5-hydroxymethylfurfural, which forms on heating: expected of a carton.' },
      { compound: 'phloridzin', kind: 'ofInterest', reason: 'Fits phloridzin, typical of apple; pressing keeps more of it.' },
      { compound: 'dodecylbenzenesulfonic acid', kind: 'contaminant', reason: 'Washing-up soap: stands in every blank.' },
    ],
  },
  {
    seed: 'juices later',
    polarity: 'negative',
    method: juiceMethod,
    study: {
      title: 'Two months later: the juices again',
      question: 'Do the differences hold in a new carton batch? One bottle of each, so only large differences can show.',
      matrix: 'apple juice, centrifuged and diluted with water',
      sideAName: 'Millrace pressed',
      sideBName: 'Tallow Lane carton, new batch',
      restricted: false,
    },
    sheet: laterJuiceSheet,
    compounds: laterBatch(juiceCompounds, seededRandom('juices later batch')),
    calibratedAt: 1,
    traced: ['Millrace-4', 'Tallow-Lane-4'],
    fileStyle: 'seconds',
    comparisonTitle: 'One bottle against one carton',
    answers: { massKind: 'mz' },
    flags: [
      { compound: '5-hydroxymethylfurfural', kind: 'oneSideOnly', reason: 'In the new batch too.' },
    ],
  },
  {
    seed: 'peels',
    polarity: 'positive',
    method: peelMethod,
    study: {
      title: 'Orange peel: grove or market stall',
      question: 'Peel for marmalade: does the fruit of the market stall carry anything that the fruit of the grove does not?',
      matrix: 'orange peel, extracted with acetonitrile',
      sideAName: 'grove fruit',
      sideBName: 'market fruit',
      restricted: false,
    },
    sheet: peelSheet,
    compounds: [
      ...peelCompounds,
      ...inventCompounds({ level: 110, between: 24, moreA: 10, moreB: 12, onlyA: 3, onlyB: 5, solvent: 10, process: 10, aboveBlankInA: 2 }, seededRandom('peels invented'), 'positive'),
    ],
    calibratedAt: 1,
    traced: [],
    fileStyle: 'wide',
    comparisonTitle: 'Grove against market stall',
    answers: { shape: 'wide' },
    flags: [
      { compound: 'thiabendazole', kind: 'contaminant', reason: 'Fits thiabendazole, used on fruit after harvest. By mass alone: needs a standard.' },
      { compound: 'carbendazim', kind: 'contaminant', reason: 'Fits carbendazim, a fungicide. By mass alone: needs a standard.' },
    ],
  },
]
