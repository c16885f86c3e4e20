import { useMemo } from 'react'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { mathOf } from './math-of.ts'
import './formula.css'

/** A formula of our own notes as MathML, which screen readers read. */
export function Formula({ tex }: { tex: string }) {
  const html = useMemo(() => ({ __html: mathOf(tex) }), [tex])
  return (
    <ScrollRegion label="Formula" className="py-2 text-panel">
      {/* Set from our own text by a typesetter: nothing that anybody entered gets here. */}
      <div className="formula w-max" dangerouslySetInnerHTML={html} />
    </ScrollRegion>
  )
}
