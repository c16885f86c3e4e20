import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { checkDefinitions, checkKeys } from '../../../shared/mechanics/checks/check-definitions.ts'

/** The checks whose failure takes a metric away. */
export function checksOf(key: MetricKey) {
  const { group } = catalogue[key]
  return checkKeys.filter((check) => checkDefinitions[check].affects.includes(group))
}
