/** What stands beside a number that the method fixes. */
export interface SettingDefinition {
  value: number
  unit: string
  /** Published source, or "common practice", or "our own". */
  source: string
  /** What a larger value does. */
  effect: string
}

export const own = 'our own'
export const practice = 'common practice'
export const owen = 'Owen et al. 2014, J Strength Cond Res 28(6):1552–1558'
