import { formatMoney, type Money } from '../../shared/contracts/money.ts'

/** An amount in the way of the reader's own locale. */
export const showMoney = (money: Money): string => formatMoney(money, navigator.language)
