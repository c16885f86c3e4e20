import { useQueryClient } from '@tanstack/react-query'
import { useNavigate } from 'react-router-dom'
import type { Me } from '../../../shared/contracts/account.ts'
import { startAs } from '../../api/account/get-me.ts'
import { Dialog } from '../../components/dialog.tsx'
import { paths } from '../../lib/paths.ts'
import { SignInForm } from './sign-in-form.tsx'

interface SessionEndedDialogProps {
  me: Me
  onSignedIn: () => void
}

/** Over the page, not instead of it: what was typed there is still there after signing in again. */
export function SessionEndedDialog({ me, onSignedIn }: SessionEndedDialogProps) {
  const queryClient = useQueryClient()
  const navigate = useNavigate()

  const leave = () => {
    onSignedIn()
    startAs(queryClient, null)
  }
  const goOn = (now: Me) => {
    onSignedIn()
    if (now.person.id === me.person.id && now.club.id === me.club.id) {
      void queryClient.invalidateQueries()
      return
    }
    startAs(queryClient, now)
    void navigate(paths.home)
  }

  return (
    <Dialog title="Your sign-in has ended" onClose={leave}>
      <p className="pb-4">Sign in again to go on from here. What is on this page is kept meanwhile.</p>
      <SignInForm email={me.person.email} onSignedIn={goOn} />
    </Dialog>
  )
}
