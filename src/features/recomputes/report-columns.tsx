import { Link } from 'react-router-dom'
import type { FigureMove, RecomputeReport } from '../../../shared/contracts/recomputes.ts'
import { MethodLink } from '../../components/method-link.tsx'
import type { Column } from '../../components/table.tsx'
import { formatDateShort } from '../../lib/format-date.ts'
import { formatValue } from '../../lib/format-figure.ts'
import { pathOf } from '../../lib/paths.ts'
import { displayOf, figureName, formatChange, formatMultiple, formatSmall } from './format-change.ts'

export const figureColumns: Column<FigureMove>[] = [
  {
    key: 'figure',
    head: 'Figure',
    cell: ({ metric, of }) => <MethodLink noteKey={metric}>{figureName(metric, of)}</MethodLink>,
  },
  { key: 'moved', head: 'Trials', figure: true, cell: ({ moved }) => moved },
  {
    key: 'median',
    head: 'Median change',
    figure: true,
    cell: ({ metric, of, medianChange }) => formatChange(medianChange, displayOf(metric, of)),
  },
  {
    key: 'greatest',
    head: 'Greatest change',
    figure: true,
    cell: ({ metric, of, greatestChange }) => formatChange(greatestChange, displayOf(metric, of)),
  },
  {
    key: 'median-multiple',
    head: 'Median, × give or take',
    figure: true,
    cell: ({ medianMultiple }) => formatMultiple(medianMultiple),
  },
  {
    key: 'greatest-multiple',
    head: 'Greatest, × give or take',
    figure: true,
    cell: ({ greatestMultiple }) => formatMultiple(greatestMultiple),
  },
  {
    key: 'u',
    head: 'Give or take itself',
    figure: true,
    emptyFor: ({ uMoved }) => uMoved === 0,
    cell: ({ uMoved, medianUFactor }) =>
      uMoved === 0
        ? 'same'
        : medianUFactor === null
          ? `other in ${uMoved}`
          : `× ${formatSmall(medianUFactor)}`,
  },
  {
    key: 'coming',
    head: 'New, gone',
    figure: true,
    emptyFor: ({ appeared, vanished }) => appeared + vanished === 0,
    cell: ({ appeared, vanished }) => (appeared + vanished === 0 ? '–' : `${appeared}, ${vanished}`),
  },
]

type Mover = RecomputeReport['greatest'][number]

export const moverColumns = (mayOpen: boolean): Column<Mover>[] => [
  {
    key: 'trial',
    head: 'Trial',
    cell: ({ trialId, athleteName, sessionTitle, sessionDate }) => {
      const words = `${athleteName ?? 'In the Tray'}, ${sessionTitle}, ${formatDateShort(sessionDate)}`
      return mayOpen ? <Link to={pathOf.trial(trialId)}>{words}</Link> : words
    },
  },
  { key: 'figure', head: 'Figure', cell: ({ metric, of }) => figureName(metric, of) },
  {
    key: 'before',
    head: 'Before',
    figure: true,
    cell: ({ metric, of, before }) => valueWords(before, metric, of),
  },
  {
    key: 'after',
    head: 'After',
    figure: true,
    cell: ({ metric, of, after }) => valueWords(after, metric, of),
  },
  {
    key: 'multiple',
    head: '× give or take',
    figure: true,
    cell: ({ multiple }) => formatMultiple(multiple),
  },
]

function valueWords(value: number, metric: string, of: Mover['of']): string {
  const display = displayOf(metric, of)
  return `${formatValue(value, display)}\u00a0${display.unit}`.trimEnd()
}
