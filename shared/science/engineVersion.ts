/** Version of what shared/science computes; stored with every alignment and every version of a comparison. Raised when a result can change. */
export const ENGINE_VERSION = '2'
