/** What a demo sample may hold. Levels are counts of the main ion in a plain injection; 0: not there. */
export interface DemoCompound {
  name: string
  formula: string
  /** True retention time of the demo's method. */
  retentionMinutes: number
  levelA: number
  levelB: number
  /** In the mixed standard. */
  standard: number
  /** In every injection, from the solvent; and, besides, in everything that was worked up. */
  solvent: number
  process: number
  /** Ions seen, by the adduct's name: share of the main ion. */
  ions: Readonly<Record<string, number>>
}

export const NOTHING = { levelA: 0, levelB: 0, standard: 0, solvent: 0, process: 0 }

type Row = readonly [name: string, formula: string, retentionMinutes: number, levelA: number, levelB: number, standard: number, ions: Readonly<Record<string, number>>]
const rowOf = ([name, formula, retentionMinutes, levelA, levelB, standard, ions]: Row): DemoCompound =>
  ({ ...NOTHING, name, formula, retentionMinutes, levelA, levelB, standard, ions })

const acid = { '[M-H]-': 1 }
const acidDimer = { '[M-H]-': 1, '[2M-H]-': 0.12 }
const acidWater = { '[M-H]-': 1, '[M-H2O-H]-': 0.15 }
const sugar = { '[M-H]-': 1, '[M+Cl]- (35Cl)': 0.7, '[M+HCOO]- (M+FA-H)': 0.45, '[2M-H]-': 0.08 }
const phenol = { '[M-H]-': 1, '[2M-H]-': 0.1 }
const glycoside = { '[M-H]-': 1, '[M+HCOO]- (M+FA-H)': 0.25, '[M+Cl]- (35Cl)': 0.06 }

/**
 * Apple juice in negative mode. True of the trade: which compounds an apple holds, that pressing keeps more of its phenols,
 * that heating makes furans, that ascorbic acid is added to cartons, that patulin comes with mould and has an isomer that
 * is an ordinary apple acid. Invented: every level and every time.
 */
export const appleCompounds: readonly DemoCompound[] = ([
  ['sucrose', 'C12H22O11', 0.97, 410_000, 390_000, 0, sugar],
  ['fructose and glucose', 'C6H12O6', 0.91, 620_000, 640_000, 0, sugar],
  ['sorbitol', 'C6H14O6', 0.93, 160_000, 150_000, 0, sugar],
  ['galacturonic acid', 'C6H10O7', 0.95, 61_000, 17_000, 0, acidWater],
  ['quinic acid', 'C7H12O6', 0.99, 185_000, 172_000, 0, acid],
  ['malic acid', 'C4H6O5', 1.12, 540_000, 500_000, 60_000, acidWater],
  ['ascorbic acid', 'C6H8O6', 1.06, 2_600, 96_000, 50_000, acid],
  ['lactic acid', 'C3H6O3', 1.27, 9_500, 8_900, 0, acid],
  ['citric acid', 'C6H8O7', 1.38, 88_000, 94_000, 60_000, acidWater],
  ['succinic acid', 'C4H6O4', 1.66, 27_000, 25_000, 0, acid],
  ['phenylalanine', 'C9H11NO2', 2.58, 14_000, 12_800, 0, acid],
  ['5-hydroxymethylfurfural', 'C6H6O3', 2.94, 0, 24_000, 40_000, acid],
  ['2-furoic acid', 'C5H4O3', 3.12, 1_900, 11_500, 0, acid],
  ['patulin', 'C7H6O4', 3.34, 5_400, 0, 30_000, acid],
  ['pantothenic acid', 'C9H17NO5', 3.71, 7_400, 7_100, 0, acid],
  ['protocatechuic acid', 'C7H6O4', 3.92, 21_000, 18_500, 40_000, acid],
  ['tryptophan', 'C11H12N2O2', 4.45, 5_600, 5_100, 0, acid],
  ['catechin', 'C15H14O6', 5.82, 34_000, 6_100, 45_000, phenol],
  ['chlorogenic acid', 'C16H18O9', 6.15, 290_000, 64_000, 55_000, acidDimer],
  ['procyanidin B2', 'C30H26O12', 6.34, 52_000, 7_700, 0, phenol],
  ['cryptochlorogenic acid', 'C16H18O9', 6.47, 26_000, 24_000, 0, acid],
  ['caffeic acid', 'C9H8O4', 6.63, 9_800, 8_800, 0, acid],
  ['epicatechin', 'C15H14O6', 6.71, 71_000, 10_500, 0, phenol],
  ['4-p-coumaroylquinic acid', 'C16H18O8', 7.03, 38_000, 13_000, 0, acidDimer],
  ['p-coumaric acid', 'C9H8O3', 7.88, 6_900, 6_200, 0, acid],
  ['quercetin 3-galactoside', 'C21H20O12', 8.12, 31_000, 9_400, 0, glycoside],
  ['quercetin 3-rhamnoside', 'C21H20O11', 8.69, 24_000, 8_100, 0, glycoside],
  ['phloretin 2′-xyloglucoside', 'C26H32O14', 8.84, 83_000, 15_000, 0, glycoside],
  ['phloridzin', 'C21H24O10', 9.36, 118_000, 20_500, 50_000, glycoside],
  ['abscisic acid', 'C15H20O4', 10.41, 4_900, 4_600, 0, acid],
  ['phloretin', 'C15H14O5', 11.18, 8_200, 1_300, 0, acid],
] satisfies Row[]).map(rowOf)

const base = { '[M+H]+': 1 }
const baseSodium = { '[M+H]+': 1, '[M+Na]+': 0.2 }
const glycosidePositive = { '[M+H]+': 1, '[M+Na]+': 0.35, '[M+NH4]+': 0.1 }

/** Orange peel in positive mode: flavones and limonoids in both, three fungicides on the fruit of the market stall. */
export const peelCompounds: readonly DemoCompound[] = ([
  ['synephrine', 'C9H13NO2', 1.42, 130_000, 121_000, 0, { '[M+H]+': 1, '[M+H-H2O]+': 0.55 }],
  ['carbendazim', 'C9H9N3O2', 3.05, 0, 38_000, 0, base],
  ['thiabendazole', 'C10H7N3S', 3.48, 0, 145_000, 0, base],
  ['narirutin', 'C27H32O14', 6.42, 56_000, 49_000, 0, glycosidePositive],
  ['imazalil', 'C14H14Cl2N2O', 6.71, 0, 92_000, 0, base],
  ['hesperidin', 'C28H34O15', 6.95, 240_000, 205_000, 0, glycosidePositive],
  ['limonin', 'C26H30O8', 9.24, 31_000, 13_000, 0, baseSodium],
  ['sinensetin', 'C20H20O7', 9.88, 64_000, 58_000, 0, baseSodium],
  ['nobiletin', 'C21H22O8', 10.51, 172_000, 160_000, 0, baseSodium],
  ['tangeretin', 'C20H20O7', 11.32, 98_000, 41_000, 0, baseSodium],
] satisfies Row[]).map(rowOf)
