/** Signed mass error in ppm, (measured − theoretical) / theoretical × 10⁶ (Brenton & Godfrey 2010, J Am Soc Mass Spectrom 21:1821). */
export function massErrorPpm(measuredMz: number, theoreticalMz: number): number {
  return (measuredMz - theoreticalMz) / theoreticalMz * 1e6
}
