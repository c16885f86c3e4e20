/** A cell of the sheet that holds a trial. */
export interface CellPlace {
  row: number
  column: number
}

/**
 * Where an arrow key leads among cells: `lengths` says how many trials each row has, from the left. Up and down
 * pass over rows without trials and keep to the column as far as the row reaches. null for another key or where
 * there is nothing further.
 */
export function moveCell(
  key: string,
  { row, column }: CellPlace,
  lengths: readonly number[],
): CellPlace | null {
  const length = lengths[row] ?? 0
  switch (key) {
    case 'ArrowRight':
      return column + 1 < length ? { row, column: column + 1 } : null
    case 'ArrowLeft':
      return column > 0 ? { row, column: column - 1 } : null
    case 'Home':
      return { row, column: 0 }
    case 'End':
      return { row, column: Math.max(0, length - 1) }
    case 'ArrowDown':
      return vertical(1)
    case 'ArrowUp':
      return vertical(-1)
    default:
      return null
  }
  function vertical(step: 1 | -1): CellPlace | null {
    for (let next = row + step; next >= 0 && next < lengths.length; next += step) {
      if (lengths[next]! > 0) return { row: next, column: Math.min(column, lengths[next]! - 1) }
    }
    return null
  }
}
