import { changeClubSettings, getClubSettings, getSeats } from '../../../shared/contracts/clubs.ts'
import {
  changeMeasuringSettings,
  changePlateCalibration,
  getMeasuringSettings,
  getPlateCalibration,
} from '../../../shared/contracts/measuring.ts'
import { implement, type Route } from '../../http/implement.ts'
import { refuseWhileRunning } from '../recomputes/recomputes.service.ts'
import { editSettings, readSeats, readSettings } from './clubs.service.ts'
import {
  editMeasuringSettings,
  editPlateCalibration,
  readMeasuringSettings,
  readPlateCalibration,
} from './measuring.service.ts'

export const clubRoutes: Route[] = [
  implement(getClubSettings, ({ deps, ctx }) => readSettings(deps, ctx)),
  implement(changeClubSettings, ({ deps, ctx, body }) => editSettings(deps, ctx, body)),
  implement(getMeasuringSettings, ({ deps, ctx }) => readMeasuringSettings(deps, ctx)),
  implement(changeMeasuringSettings, ({ deps, ctx, body }) =>
    editMeasuringSettings(deps, ctx, body, refuseWhileRunning),
  ),
  implement(getPlateCalibration, ({ deps, ctx }) => readPlateCalibration(deps, ctx)),
  implement(changePlateCalibration, ({ deps, ctx, body }) =>
    editPlateCalibration(deps, ctx, body, refuseWhileRunning),
  ),
  implement(getSeats, ({ deps, ctx }) => readSeats(deps, ctx)),
]
