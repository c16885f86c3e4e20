/** Query keys of how the club measures; apart from the queries, so that a page that reads none loads none. */
export const measuringSettingsKey = ['measuring-settings'] as const
export const plateCalibrationKey = ['plate-calibration'] as const
