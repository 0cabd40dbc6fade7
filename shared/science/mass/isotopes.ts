/** One isotope of an element: mass number, mass in u and natural abundance (0 to 1). */
export interface Isotope {
  number: number
  mass: number
  abundance: number
}

const isotope = (number: number, mass: number, abundance: number): Isotope => ({ number, mass, abundance })

/**
 * Isotopes of the elements met in small-molecule work; the first of each element is the one that monoisotopic masses use.
 * Masses: AME2020 (Wang et al. 2021, Chin Phys C 45:030003). Abundances: Berglund & Wieser 2011, Pure Appl Chem 83:397.
 * Lithium stands as its heavy isotope alone, the one seen as an adduct.
 */
export const ISOTOPES: Readonly<Record<string, readonly Isotope[]>> = {
  H: [isotope(1, 1.007825031898, 0.999885), isotope(2, 2.014101777844, 0.000115)],
  Li: [isotope(7, 7.01600343426, 1)],
  C: [isotope(12, 12, 0.9893), isotope(13, 13.00335483534, 0.0107)],
  N: [isotope(14, 14.00307400425, 0.99636), isotope(15, 15.00010889827, 0.00364)],
  O: [isotope(16, 15.99491461926, 0.99757), isotope(17, 16.99913175595, 0.00038), isotope(18, 17.99915961214, 0.00205)],
  F: [isotope(19, 18.99840316207, 1)],
  Na: [isotope(23, 22.98976928195, 1)],
  Si: [isotope(28, 27.97692653442, 0.92223), isotope(29, 28.97649466434, 0.04685), isotope(30, 29.973770137, 0.03092)],
  P: [isotope(31, 30.97376199768, 1)],
  S: [isotope(32, 31.97207117354, 0.9499), isotope(33, 32.97145890862, 0.0075), isotope(34, 33.967867011, 0.0425), isotope(36, 35.967080692, 0.0001)],
  Cl: [isotope(35, 34.968852694, 0.7576), isotope(37, 36.965902573, 0.2424)],
  K: [isotope(39, 38.96370648482, 0.932581), isotope(40, 39.963998165, 0.000117), isotope(41, 40.96182525611, 0.067302)],
  Br: [isotope(79, 78.918337574, 0.5069), isotope(81, 80.916288197, 0.4931)],
  I: [isotope(127, 126.904472592, 1)],
}
