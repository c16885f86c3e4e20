import { PageHead } from '../components/page-head.tsx'
import { CautionsSheet } from '../features/methods/cautions-sheet.tsx'
import { MethodsIndex } from '../features/methods/methods-index.tsx'

export function MethodsPage() {
  return (
    <>
      <PageHead title="Methods" context="What every figure means, how it is computed, and what it rests on" />
      <MethodsIndex />
      <div className="pt-5">
        <CautionsSheet />
      </div>
    </>
  )
}
