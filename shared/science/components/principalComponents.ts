import { EigenvalueDecomposition, Matrix } from 'ml-matrix'
import { PCA } from 'ml-pca'
import { gramMatrix } from './gramMatrix'
import { orient } from './orient'

/** Principal components of a table. Component k is the k-th of each list. */
export interface PrincipalComponents {
  /** Number of components that hold any variance: the rank. */
  rank: number
  /** Variance of every component, n − 1 in the divisor, and its share of the whole. */
  variance: Float64Array
  share: Float64Array
  /** Of the first components: one value a sample, and one a feature. */
  scores: Float64Array[]
  loadings: Float64Array[]
}

export interface ComponentsAsked {
  /** Components that get scores and loadings (default 5); never more than the rank. */
  most?: number
  /** By the features' singular values, or by the samples' Gram matrix; by default what is smaller. The result is the same. */
  way?: 'features' | 'samples'
  /** Told the share that is done, 0 to 1. */
  onProgress?: (share: number) => void
}

/** A variance below this share of the greatest is rounding. */
const ROUNDING = 1e-12

/**
 * Principal components of a table whose columns are centred (and scaled, if they shall be). The largest loading of a component,
 * by size, is positive.
 *
 * @param values samples × features, sample after sample, without missing values; not changed
 * @returns rank 0 and empty lists where nothing varies
 * Source: Jolliffe (2002) Principal Component Analysis, 2nd ed.; the Gram matrix has the same eigenvalues (section 3.5 there).
 */
export function principalComponents(values: Float64Array, samples: number, features: number, { most = 5, way, onProgress }: ComponentsAsked = {}): PrincipalComponents {
  if (samples < 2 || features < 1) return { rank: 0, variance: new Float64Array(0), share: new Float64Array(0), scores: [], loadings: [] }
  const axes = (way ?? (features > samples ? 'samples' : 'features')) === 'samples'
    ? axesBySamples(values, samples, features, onProgress)
    : axesByFeatures(values, samples, features)
  const greatest = axes.variance[0] ?? 0
  const possible = Math.min(samples - 1, features)
  let rank = 0
  while (rank < possible && axes.variance[rank]! > greatest * ROUNDING) rank++
  const variance = axes.variance.slice(0, rank)
  const whole = variance.reduce((sum, each) => sum + each, 0)
  const shown = Array.from({ length: Math.min(most, rank) }, (_, k) => orient(axes.component(k)))
  return {
    rank,
    variance,
    share: variance.map(each => each / whole),
    scores: shown.map(({ scores }) => scores),
    loadings: shown.map(({ loadings }) => loadings),
  }
}

interface Axes {
  /** In descending order. */
  variance: Float64Array
  component: (k: number) => { scores: Float64Array, loadings: Float64Array }
}

/** Tall tables: singular values of the table itself. */
function axesByFeatures(values: Float64Array, samples: number, features: number): Axes {
  const table = Matrix.from1DArray(samples, features, Array.from(values))
  const components = new PCA(table, { center: false, scale: false })
  const vectors = components.getEigenvectors()
  return {
    variance: Float64Array.from(components.getEigenvalues()),
    component: (k) => {
      const loadings = Float64Array.from(vectors.getColumn(k))
      return { loadings, scores: scoresAlong(values, samples, features, loadings) }
    },
  }
}

function scoresAlong(values: Float64Array, samples: number, features: number, loadings: Float64Array): Float64Array {
  return Float64Array.from({ length: samples }, (_, i) => {
    let sum = 0
    for (let j = 0; j < features; j++) sum += values[i * features + j]! * loadings[j]!
    return sum
  })
}

/** Wide tables: the Gram matrix of the samples, whose eigenvectors are the scores but for their length. */
function axesBySamples(values: Float64Array, samples: number, features: number, onProgress: (share: number) => void = () => {}): Axes {
  const gram = gramMatrix(values, samples, features, onProgress)
  const eigen = new EigenvalueDecomposition(Matrix.from1DArray(samples, samples, Array.from(gram)), { assumeSymmetric: true })
  const order = eigen.realEigenvalues.map((value, at) => ({ value: Math.max(0, value), at })).sort((a, b) => b.value - a.value)
  return {
    variance: Float64Array.from(order, ({ value }) => value / (samples - 1)),
    component: (k) => {
      const { value, at } = order[k] ?? { value: 0, at: 0 }
      const length = Math.sqrt(value)
      const direction = eigen.eigenvectorMatrix.getColumn(at)
      const loadings = new Float64Array(features)
      direction.forEach((weight, i) => {
        const own = weight / length
        const row = i * features
        for (let j = 0; j < features; j++) loadings[j]! += own * values[row + j]!
      })
      return { scores: Float64Array.from(direction, weight => weight * length), loadings }
    },
  }
}
