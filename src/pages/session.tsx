import { useParams } from 'react-router-dom'
import { useSession } from '../api/sessions/get-session.ts'
import { useClubEvents } from '../api/events/use-club-events.ts'
import { QueryState } from '../components/query-state.tsx'
import { SessionSheet } from '../features/sessions/session-sheet.tsx'
import { DropArea } from '../features/uploads/drop-area.tsx'
import { useUploadQueue } from '../features/uploads/use-upload-queue.ts'

export function SessionPage() {
  const { sessionId = '' } = useParams()
  const session = useSession(sessionId)
  const { queue, files } = useUploadQueue(sessionId)
  useClubEvents()
  return (
    <QueryState query={session} what="the session">
      {(sheet) => (
        <DropArea onFiles={(dropped) => queue.add(dropped, sheet.uploads)}>
          {(addFiles) => <SessionSheet sheet={sheet} files={files} queue={queue} addFiles={addFiles} />}
        </DropArea>
      )}
    </QueryState>
  )
}
