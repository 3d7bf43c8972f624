const written = new Intl.DateTimeFormat('en-US', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
})

/** "November 30, 2026" from a plain date; no time zone moves it to the day before. */
export const dayInWords = (date: string): string => written.format(new Date(`${date}T00:00:00Z`))
