import { NavLink, useLocation } from 'react-router-dom'
import type { Me } from '../../shared/contracts/account.ts'
import { useSignOut } from '../api/account/sign-out.ts'
import { Button } from '../components/button.tsx'
import { classNames } from '../lib/class-names.ts'
import { paths } from '../lib/paths.ts'
import { roleNames } from '../lib/role-names.ts'
import { navItemsFor, type NavItem } from './navigation.ts'
import { Wordmark } from './wordmark.tsx'

/** Wordmark, club, the pages of one's roles, oneself. */
export function TopBar({ me }: { me: Me }) {
  const items = navItemsFor(me.roles)
  const { pathname } = useLocation()
  return (
    <header className="no-print border-b border-rule">
      <a
        href="#page"
        className="sr-only focus:not-sr-only focus:absolute focus:z-20 focus:bg-sheet focus:px-3 focus:py-2"
      >
        Skip to the page
      </a>
      <div className="mx-auto flex max-w-[90rem] flex-wrap items-end gap-x-7 px-4 md:px-8">
        <Wordmark clubName={me.club.name} />
        {items.length > 1 && (
          <nav aria-label="Pages" className="order-last w-full md:order-none md:w-auto">
            <ul className="flex flex-wrap gap-x-4 sm:gap-x-6">
              {items.map((item) => (
                <li key={item.path}>
                  <NavLink
                    to={item.path}
                    className={({ isActive }) => navLinkClass(isActive || holds(item, pathname))}
                  >
                    {item.words}
                  </NavLink>
                </li>
              ))}
            </ul>
          </nav>
        )}
        <Oneself me={me} />
      </div>
      {me.club.demo && (
        <p className="border-t border-rule bg-band px-4 py-0.5 text-center text-small">
          Demo data, invented: no real club, no real people.
        </p>
      )}
    </header>
  )
}

const holds = (item: NavItem, pathname: string) => item.holds !== undefined && pathname.startsWith(item.holds)

function navLinkClass(isActive: boolean): string {
  return classNames(
    'block pt-3 pb-2.5 whitespace-nowrap no-underline hover:text-ink',
    isActive ? 'tape-under font-semibold' : 'text-ink-2',
  )
}

function Oneself({ me }: { me: Me }) {
  const signOut = useSignOut()
  return (
    <div className="ms-auto flex items-baseline gap-4 pt-3 pb-2.5 text-small">
      <NavLink to={paths.account} className="text-ink-2 hover:text-ink">
        {me.person.name}
        <span className="hidden md:inline">
          , {me.roles.map((role) => roleNames[role].toLowerCase()).join(', ')}
        </span>
      </NavLink>
      <Button
        look="word"
        className="min-h-0! text-ink-2"
        busy={signOut.isPending}
        onClick={() => signOut.mutate({})}
      >
        Sign out
      </Button>
    </div>
  )
}
