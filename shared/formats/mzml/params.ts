import { MzmlRefused } from './mzmlRefused'

/** One term of the vocabulary with its value. */
export interface Param { accession: string, name: string, value: string, unitAccession: string }

/** Longer values are none that the reader uses. */
const LONGEST_VALUE = 1024
const MOST_PARAMS = 1000
const MOST_GROUPED = 5000

/** The terms of one element: its own stand before those of the groups it refers to. */
export class ParamList {
  private own: Param[] = []
  private grouped: readonly Param[] = []

  add(attributes: Record<string, string>): void {
    const param = { accession: attributes.accession ?? '', name: attributes.name ?? '', value: attributes.value ?? '', unitAccession: attributes.unitAccession ?? '' }
    if (Object.values(param).some(text => text.length > LONGEST_VALUE)) return
    if (this.own.length === MOST_PARAMS) throw new MzmlRefused(`One part of the file has more than ${MOST_PARAMS} terms: no instrument writes that.`)
    this.own.push(param)
  }

  addGroup(params: readonly Param[]): void {
    if (this.grouped.length + params.length > MOST_GROUPED) throw new MzmlRefused(`The file's parameter groups hold more than ${MOST_GROUPED} terms: no instrument writes that.`)
    this.grouped = this.grouped.length === 0 ? params : [...this.grouped, ...params]
  }

  all(): readonly Param[] {
    return this.own.length === 0 ? this.grouped : [...this.own, ...this.grouped]
  }

  find(accession: string): Param | undefined {
    return this.own.find(param => param.accession === accession) ?? this.grouped.find(param => param.accession === accession)
  }

  has(accession: string): boolean {
    return this.find(accession) !== undefined
  }
}

/** The referenceable parameter groups of a file, by their id. */
export class ParamGroups {
  private readonly groups = new Map<string, readonly Param[]>()
  private kept = 0

  set(id: string, list: ParamList): void {
    const params = list.all()
    this.kept += params.length + 1
    if (this.kept > MOST_GROUPED) throw new MzmlRefused(`The file's parameter groups hold more than ${MOST_GROUPED} terms: no instrument writes that.`)
    this.groups.set(id, params)
  }

  get(id: string): readonly Param[] {
    const group = this.groups.get(id)
    if (!group) throw new MzmlRefused(`The file refers to a parameter group “${id.slice(0, 80)}” that it does not have.`)
    return group
  }
}
