import { useState, type ReactNode } from 'react'
import { useDropzone } from 'react-dropzone'
import { limits } from '../../../shared/contracts/limits.ts'
import { Button } from '../../components/button.tsx'
import { Notice } from '../../components/notice.tsx'
import './drop-area.css'

interface Props {
  onFiles: (files: File[]) => void
  /** The page, which takes files anywhere on it; it places the button that chooses them. */
  children: (addFiles: ReactNode) => ReactNode
}

/** Takes files dropped anywhere on the page, or chosen by the button. */
export function DropArea({ onFiles, children }: Props) {
  const [leftOut, setLeftOut] = useState<{ dropped: number; from: string } | null>(null)
  const take = (files: File[]) => {
    const first = files.slice(0, limits.filesPerDrop)
    const next = files[limits.filesPerDrop]
    setLeftOut(next ? { dropped: files.length, from: next.name } : null)
    if (first.length > 0) onFiles(first)
  }
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    onDrop: take,
    noClick: true,
    noKeyboard: true,
    useFsAccessApi: false,
  })
  return (
    <div {...getRootProps({ role: undefined })} className="relative min-h-[70dvh]">
      <input {...getInputProps({ 'aria-label': 'Recordings to add' })} />
      {leftOut && (
        <Notice
          tone="caution"
          role="status"
          title={`${limits.filesPerDrop} files were taken, ${leftOut.dropped} were dropped`}
        >
          <p>
            {limits.filesPerDrop} at a time is the most. Those from {leftOut.from} on were not taken: add them
            when these are through.
          </p>
        </Notice>
      )}
      {children(<Button onClick={open}>Add files</Button>)}
      {isDragActive && (
        <div className="drop-veil" aria-hidden="true">
          <p className="text-page font-semibold">Let go to add the recordings to this session</p>
        </div>
      )}
    </div>
  )
}
