import type { Role } from '../../../shared/permissions'

/** The signed-in person, as every domain function takes them. */
export interface Person { id: string, name: string, signInName: string, roles: Role[] }
