import { formatGiven } from '#shared/numberFormat.ts'

/** A size in mm as draughtsmen write it: no thousands separators, a decimal only where there is one, no unit. */
export function formatSize(mm: number): string {
  return formatGiven(Math.round(mm * 10) / 10, 7).replaceAll('\u202F', '')
}
