export * from './actions'
export * from './can'
export * from './roles'
