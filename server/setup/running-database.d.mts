export function runningDatabase(): string | undefined
