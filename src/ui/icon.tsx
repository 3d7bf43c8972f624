/** Our own line drawings, 24 × 24. Each stands beside its word; none is the only sign of anything. */
const paths = {
  next: 'M5 12h13M13 6l6 6-6 6',
  back: 'M19 12H6M11 6l-6 6 6 6',
  menu: 'M4 7h16M4 12h16M4 17h16',
  close: 'M6 6l12 12M18 6L6 18',
  plus: 'M12 5v14M5 12h14',
  tick: 'M4 12.5l5 5L20 6.5',
  undo: 'M9 6L5 10l4 4M5 10h9a5 5 0 0 1 0 10h-3',
  erase: 'M8 6h12v12H8l-5-6zM11 10l5 4M16 10l-5 4',
  lock: 'M6 11h12v9H6zM8.5 11V8a3.5 3.5 0 0 1 7 0v3',
  device: 'M7 3h10v18H7zM11 18h2',
  mail: 'M3 6h18v12H3zM3 7l9 7 9-7',
  phone: 'M5 4h5l2 5-3 2c1 2 2 3 4 4l2-3 5 2v5c-8 3-18-7-15-15z',
  search: 'M16.5 10.5a6 6 0 1 1-12 0 6 6 0 0 1 12 0zM15 15l5.500 5.500',
  print: 'M7 9V4h10v5M7 17H4V9h16v8h-3M7 14h10v6H7z',
  copy: 'M9 9h11v11H9zM5 15H4V4h11v1',
  remove: 'M5 7h14M9 7V4h6v3M7 7l1 13h8l1-13',
  more: 'M5 12h.01M12 12h.01M19 12h.01',
  down: 'M6 9l6 6 6-6',
  file: 'M6 3h8l4 4v14H6zM14 3v4h4M9 12h6M9 16h6',
} as const

export type IconName = keyof typeof paths | 'theme'

/** A drawing beside a word. Hidden from readers: the word is what counts. */
export function Icon({ name, className = '' }: { name: IconName; className?: string }) {
  return (
    <svg className={`icon ${className}`} viewBox="0 0 24 24" aria-hidden="true" focusable="false">
      {name === 'theme' ? (
        <>
          <circle cx="12" cy="12" r="8" />
          <path d="M12 4a8 8 0 0 1 0 16z" fill="currentColor" />
        </>
      ) : (
        <path d={paths[name]} />
      )}
    </svg>
  )
}
