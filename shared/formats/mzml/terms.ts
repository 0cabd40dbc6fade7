/** Accessions of the PSI-MS vocabulary and the Unit Ontology that the reader knows. */
export const MS_LEVEL = 'MS:1000511'
export const MS1_SPECTRUM = 'MS:1000579'
export const NEGATIVE_SCAN = 'MS:1000129'
export const POSITIVE_SCAN = 'MS:1000130'
export const PROFILE_SPECTRUM = 'MS:1000128'
export const SCAN_START_TIME = 'MS:1000016'
export const MZ_ARRAY = 'MS:1000514'
export const INTENSITY_ARRAY = 'MS:1000515'
export const FLOAT_64 = 'MS:1000523'
export const FLOAT_32 = 'MS:1000521'
export const ZLIB = 'MS:1000574'
export const NO_COMPRESSION = 'MS:1000576'

/** How many of the unit make a minute; both vocabularies have been used for it. */
export const UNITS_IN_A_MINUTE: Record<string, number> = { 'UO:0000031': 1, 'UO:0000010': 60, 'UO:0000028': 60_000, 'MS:1000038': 1, 'MS:1000039': 60 }
