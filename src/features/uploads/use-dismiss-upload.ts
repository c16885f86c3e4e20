import type { Upload } from '../../../shared/contracts/uploads.ts'
import { useChangeUpload } from '../../api/uploads/change-upload.ts'
import { useAnnounce } from '../../components/announcer.tsx'

/** Puts a dismissed file back into the Tray. */
export function useTakeBackUpload({ id, fileName }: Upload, onDone: () => void = () => {}) {
  const announce = useAnnounce()
  const change = useChangeUpload(() => {
    announce({ text: `Back in the Tray: ${fileName}.` })
    onDone()
  })
  const takeBack = (version: number) =>
    change.mutate({ params: { uploadId: id }, body: { version, dismissed: false } })
  return { takeBack, busy: change.isPending, error: change.error }
}

/** Clears a file from the Tray; can be undone from where it is announced, and later among the dismissed. */
export function useDismissUpload(upload: Upload, onDone: () => void) {
  const announce = useAnnounce()
  const { takeBack } = useTakeBackUpload(upload)
  const change = useChangeUpload(({ version }) => {
    announce({ text: `Dismissed: ${upload.fileName}. The file is kept.`, undo: () => takeBack(version) })
    onDone()
  })
  const dismiss = () =>
    change.mutate({ params: { uploadId: upload.id }, body: { version: upload.version, dismissed: true } })
  return { dismiss, busy: change.isPending, error: change.error }
}
