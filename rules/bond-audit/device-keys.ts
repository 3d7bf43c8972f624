/** Names of what can be one way or another in a state. */
export const switchKey = (partId: string) => `switch:${partId}`
/** @param feedKey a run's key, see `feedsOf` */
export const cordKey = (feedKey: string) => `cord:${feedKey}`
export const relayKey = (partId: string) => `relay:${partId}`
