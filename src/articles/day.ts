const written = new Intl.DateTimeFormat('en-US', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
})

const typed = new Intl.DateTimeFormat('en-US', { dateStyle: 'medium', timeStyle: 'short' })

/** "Nov 30, 2026, 4:05 PM" from a moment, by this device's clock. */
export const momentInWords = (moment: string): string => typed.format(new Date(moment))

/** "November 30, 2026" from a plain date; no time zone moves it to the day before. */
export const dayInWords = (date: string): string => written.format(new Date(`${date}T00:00:00Z`))
