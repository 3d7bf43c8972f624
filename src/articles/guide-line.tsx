/** Who decides, at the foot of every page that says what to do. */
export function GuideLine() {
  return (
    <p className="knowledge-foot">
      A guide, not an inspection. Local code and the authority having jurisdiction (your local inspector)
      decide.
    </p>
  )
}
