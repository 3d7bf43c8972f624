/** The rail with no readings on it: dotted, neutral left, hot right. */
export function EmptyRail() {
  return (
    <div
      className="front-rail"
      role="img"
      aria-label="No readings yet: an empty rail between neutral and hot."
    >
      <i className="front-n" aria-hidden="true">
        N
      </i>
      <i className="front-h" aria-hidden="true">
        H
      </i>
    </div>
  )
}
