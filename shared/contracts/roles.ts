import { z } from 'zod'

export const roles = ['coach', 'physio', 'athlete', 'admin'] as const
export const Role = z.enum(roles)
export type Role = z.infer<typeof Role>

/** Roles that read the club's measurements. */
export const staffRoles = ['coach', 'physio', 'admin'] as const satisfies readonly Role[]
export const measuringRoles = ['coach', 'physio'] as const satisfies readonly Role[]
