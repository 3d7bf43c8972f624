const day = new Intl.DateTimeFormat('en-US', { day: 'numeric', month: 'long', year: 'numeric' })

/** "November 3, 2026", in the time of whoever looks. */
export const dayOf = (moment: string): string => day.format(new Date(moment))

/** "312 kB". */
export const sizeOf = (bytes: number): string =>
  bytes < 1000 ? `${bytes} bytes` : `${Math.round(bytes / 1000).toLocaleString('en-US')} kB`
