import {
  changeSession,
  createSession,
  getSession,
  listSessions,
  publishSession,
} from '../../../shared/contracts/sessions.ts'
import { implement, type Route } from '../../http/implement.ts'
import { publish } from './publish.service.ts'
import * as sessions from './sessions.service.ts'
import { sheet } from './sheet.service.ts'

export const sessionRoutes: Route[] = [
  implement(listSessions, ({ deps, ctx, query }) => sessions.list(deps, ctx, query)),
  implement(createSession, ({ deps, ctx, body }) => sessions.create(deps, ctx, body)),
  implement(getSession, ({ deps, ctx, params }) => sheet(deps, ctx, params.sessionId)),
  implement(changeSession, ({ deps, ctx, params, body }) =>
    sessions.change(deps, ctx, params.sessionId, body),
  ),
  implement(publishSession, ({ deps, ctx, params, body }) =>
    publish(deps, ctx, { sessionId: params.sessionId, ...body }),
  ),
]
