import { useLasting } from '../offline/lasting.ts'

/** "1.2 MB". */
const megabytes = (bytes: number): string =>
  `${(bytes / 1e6).toLocaleString('en-US', { maximumFractionDigits: bytes < 1e7 ? 1 : 0 })} MB`

/** Whether this browser may clear the sheets, and how much room there is. */
export function HowLongKept() {
  const lasting = useLasting()
  if (lasting === undefined) return null
  const { agreed, used, free } = lasting
  return (
    <p className="mt-3 text-small text-ink-2">
      {agreed
        ? 'They stay until you remove them: this browser agreed to clear nothing here by itself.'
        : 'This browser may clear them when the device runs full: it has not agreed to keep them.'}
      {used !== undefined && free !== undefined && ` ${megabytes(used)} used, ${megabytes(free)} free.`}
    </p>
  )
}
