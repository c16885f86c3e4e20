/** A direction or a place in the laboratory: x, y, z. */
export type Vector = readonly [number, number, number]

/** The unit vectors of a plate's own axes in the laboratory. */
export interface PlateAxes {
  x: Vector
  y: Vector
  z: Vector
}

const minus = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]]
const length = (a: Vector): number => Math.hypot(...a)
const scaled = (a: Vector, factor: number): Vector => [a[0] * factor, a[1] * factor, a[2] * factor]
const cross = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]

/**
 * A plate's axes from its corners, which lie in the quadrants +x+y, −x+y, −x−y, +x−y of the plate (c3d.org user
 * guide, FORCE_PLATFORM:CORNERS): x from the second to the first, z on x and on the way from the fourth to the
 * first. null where the corners span no plate.
 */
export function plateAxes(corners: readonly Vector[]): PlateAxes | null {
  const [c1, c2, , c4] = corners
  if (!c1 || !c2 || !c4) return null
  const alongX = minus(c1, c2)
  const normal = cross(alongX, minus(c1, c4))
  const [side, area] = [length(alongX), length(normal)]
  if (!(side > 0) || !(area > 0) || !Number.isFinite(area)) return null
  const x = scaled(alongX, 1 / side)
  const z = scaled(normal, 1 / area)
  return { x, y: cross(z, x), z }
}

/**
 * Which laboratory axis is up: the one that the plates' normals lie along, with the sign that POINT:Y_SCREEN gives
 * it, else plus. 0, 1 or 2 for x, y or z.
 */
export function upAxis(plates: readonly PlateAxes[], yScreen: string): { axis: 0 | 1 | 2; sign: 1 | -1 } {
  const along = [0, 1, 2].map((axis) => plates.reduce((sum, { z }) => sum + Math.abs(z[axis] ?? 0), 0))
  const axis = along.indexOf(Math.max(...along)) as 0 | 1 | 2
  const screen = /^([+-]?)([XYZ])$/u.exec(yScreen.trim().toUpperCase())
  const isNegative = screen?.[1] === '-' && screen[2] === 'XYZ'[axis]
  return { axis, sign: isNegative ? -1 : 1 }
}
