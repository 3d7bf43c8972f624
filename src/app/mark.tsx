/** The product's mark: the closed triangle with a lamp and three rays. */
export function Mark() {
  return (
    <svg viewBox="0 0 38 34" aria-hidden="true" focusable="false" fill="none">
      <path d="M5 5H33" stroke="var(--ink)" strokeWidth="3.6" />
      <path d="M5 5L19 20L33 5" stroke="var(--ink)" strokeWidth="2.5" />
      <circle cx="5" cy="5" r="3.4" fill="var(--plate)" stroke="var(--ink)" strokeWidth="2.5" />
      <circle cx="33" cy="5" r="4.8" fill="var(--ink)" />
      <circle cx="19" cy="20.5" r="6.6" fill="var(--glow)" />
      <path d="M10.6 26.2L7.4 29M19 29.6V33.4M27.4 26.2L30.6 29" stroke="var(--glow)" strokeWidth="2.4" />
    </svg>
  )
}
