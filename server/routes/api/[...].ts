import { notFound } from '../../domain/DomainError'

/** An unknown address below /api is no page. */
export default defineRoute(() => {
  throw notFound()
})
