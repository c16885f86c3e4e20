import { roles, type Role } from '../../../shared/contracts/roles.ts'
import { TickList } from '../../components/tick-list.tsx'
import { roleMeanings, roleNames } from '../../lib/role-names.ts'

interface RolePickerProps {
  chosen: Role[]
  onChange: (roles: Role[]) => void
  error: string | undefined
}

/** One person may hold several. */
export function RolePicker({ chosen, onChange, error }: RolePickerProps) {
  return (
    <TickList
      label="Roles"
      items={roles.map((role) => ({ id: role, words: roleNames[role], hint: roleMeanings[role] }))}
      none=""
      chosen={chosen}
      onChange={(ids) => onChange(roles.filter((role) => ids.includes(role)))}
      error={error}
    />
  )
}
