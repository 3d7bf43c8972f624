import { useEffect, useState } from 'react'

/** Dotted rails where the content will hang, shown only once the wait is felt (300 ms). */
export function Waiting({ what, count }: { what: string; count?: string }) {
  const [felt, setFelt] = useState(false)
  useEffect(() => {
    const timer = setTimeout(() => setFelt(true), 300)
    return () => clearTimeout(timer)
  }, [])
  return (
    <div role="status" className="waiting" aria-label={`Loading ${what}`}>
      {felt && (
        <>
          <i />
          <i style={{ width: '70%' }} />
          <i style={{ width: '84%' }} />
          {count !== undefined && <span className="text-note text-ink-2">{count}</span>}
        </>
      )}
    </div>
  )
}
