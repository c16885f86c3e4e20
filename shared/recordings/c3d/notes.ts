import type { Note } from '../../mechanics/types.ts'

/** What reading a C3D file assumes or takes on trust. */
export const c3dNotes = {
  plateNotPlaced: (plate: number): Note => ({
    code: 'plate-not-placed',
    sentence: `The file does not say how plate ${plate} lies; its vertical axis was taken as pointing down, as the C3D guide has it.`,
  }),
  calibrationMatrix: (plate: number): Note => ({
    code: 'calibration-matrix-used',
    sentence: `The force of plate ${plate} was made of its channels by the calibration matrix in the file.`,
  }),
  unitAssumed: (plate: number): Note => ({
    code: 'force-unit-assumed',
    sentence: `The file names no unit for the force of plate ${plate}; N was taken, as the C3D guide has it.`,
  }),
}
