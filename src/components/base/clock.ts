/** Times are UTC milliseconds; they are shown in the zone of this machine, which is named. */
const dateTime = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
})
const date = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' })
const timeOnly = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' })

export function formatTime(at: number): string {
  return dateTime.format(at)
}

export function formatDate(at: number): string {
  return date.format(at)
}

export function formatClock(at: number): string {
  return timeOnly.format(at)
}

/** "Europe/Oslo" */
export const zone = Intl.DateTimeFormat().resolvedOptions().timeZone
