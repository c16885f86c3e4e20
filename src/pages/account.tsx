import { useMe } from '../api/account/get-me.ts'
import { Facts } from '../components/facts.tsx'
import { PageHead } from '../components/page-head.tsx'
import { Sheet } from '../components/sheet.tsx'
import { ChangePasswordForm } from '../features/account/change-password-form.tsx'
import { ThemeChoice } from '../features/account/theme-choice.tsx'
import { roleNames } from '../lib/role-names.ts'

export function AccountPage() {
  const me = useMe().data
  if (!me) return null
  return (
    <>
      <PageHead context={me.club.name} title="Your account" />
      <div className="grid items-start gap-5 lg:grid-cols-2">
        <div className="flex flex-col gap-5">
          <Sheet title="You">
            <Facts
              facts={[
                ['Name', me.person.name],
                ['E-mail address', me.person.email],
                ['In this club as', me.roles.map((role) => roleNames[role]).join(', ')],
              ]}
            />
            <p className="pt-2 text-small text-ink-2">If one of these is wrong, tell your club’s admin.</p>
          </Sheet>
          <Sheet title="Look">
            <ThemeChoice />
          </Sheet>
        </div>
        <Sheet title="Password">
          <ChangePasswordForm email={me.person.email} />
        </Sheet>
      </div>
    </>
  )
}
