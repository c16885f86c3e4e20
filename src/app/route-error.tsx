import { useRouteError } from 'react-router-dom'
import { isApiError } from '../api/api-error.ts'
import { Button } from '../components/button.tsx'
import { PageHead } from '../components/page-head.tsx'
import { errorWording } from '../lib/error-wording.ts'

/** A page that broke, or whose script could not be fetched: an old tab after a new version, or no connection. */
export function RouteError({ framed = false }: { framed?: boolean }) {
  const error = useRouteError()
  const { title, advice } = errorWording[isApiError(error) ? error.code : 'internal']
  return (
    <div className={framed ? 'mx-auto max-w-[90rem] px-4 md:px-8' : undefined}>
      <PageHead title={isApiError(error) ? title : 'This page could not be shown'} />
      <p className="max-w-prose pb-5">
        {isApiError(error)
          ? advice
          : 'Load it again. If it goes on, tell whoever runs Underfoot at your club.'}
      </p>
      <Button look="main" onClick={() => window.location.reload()}>
        Load the page again
      </Button>
    </div>
  )
}
