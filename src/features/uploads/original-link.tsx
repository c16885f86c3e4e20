import type { Upload } from '../../../shared/contracts/uploads.ts'
import { originalAddress } from '../../api/uploads/original-address.ts'

/** The file as it came is kept, whatever became of it. */
export function OriginalLink({ upload }: { upload: Upload }) {
  return (
    <a href={originalAddress(upload.id)} download>
      Download the original <span className="sr-only">of {upload.fileName}</span>
    </a>
  )
}
