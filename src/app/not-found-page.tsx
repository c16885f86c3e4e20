import { ErrorPage } from './error-page.tsx'

export function NotFoundPage() {
  return <ErrorPage code="not-found" />
}
