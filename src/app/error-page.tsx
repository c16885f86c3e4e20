import type { AnyErrorCode } from '../api/api-error.ts'
import { ButtonLink } from '../components/button.tsx'
import { PageHead } from '../components/page-head.tsx'
import { errorWording } from '../lib/error-wording.ts'
import { paths } from '../lib/paths.ts'

/** A whole page that says why there is no page. */
export function ErrorPage({ code }: { code: AnyErrorCode }) {
  const { title, advice } = errorWording[code]
  return (
    <>
      <PageHead title={title} />
      <p className="max-w-prose pb-5">{advice}</p>
      <ButtonLink to={paths.home}>Go to the start page</ButtonLink>
    </>
  )
}
