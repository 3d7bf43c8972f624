/** The shop whose pages these are, until its details come from its own settings. */
export const shop = { name: 'Tavenmere Valley Small Power', phone: '555-0142' } as const
