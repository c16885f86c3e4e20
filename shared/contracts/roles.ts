import { z } from 'zod'

export const roles = ['coach', 'physio', 'athlete', 'admin'] as const
export const Role = z.enum(roles)
export type Role = z.infer<typeof Role>

/** What somebody is in a club: at least one role, none named twice. */
export const RoleSet = z
  .array(Role)
  .min(1, 'Choose at least one role')
  .refine((chosen) => new Set(chosen).size === chosen.length, 'A role is named twice')

/** Roles that read the club's measurements. */
export const staffRoles = ['coach', 'physio', 'admin'] as const satisfies readonly Role[]
export const measuringRoles = ['coach', 'physio'] as const satisfies readonly Role[]
