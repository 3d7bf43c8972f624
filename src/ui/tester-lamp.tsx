export type LampState = 'lit' | 'dim' | 'dark'
export const lampWords: Record<LampState, string> = { lit: 'Lit', dim: 'Dim', dark: 'Dark' }

/** Eight rays from r 14.5 to r 19.5 about the middle of the lamp. */
const rays = Array.from({ length: 8 }, (_, i) => {
  const [x, y] = [Math.cos((i * Math.PI) / 4), Math.sin((i * Math.PI) / 4)]
  const at = (r: number) => `${(22 + r * x).toFixed(1)} ${(22 + r * y).toFixed(1)}`
  return `M${at(14.5)}L${at(19.5)}`
}).join('')

/** The drawing inside a 44 × 44 box: rays, half, stroke; the shape carries the state in any color. */
export function LampShape({ state }: { state: LampState | undefined }) {
  if (state === undefined)
    return <circle className="lamp-glass" cx="22" cy="22" r="10" strokeDasharray="4 4" />
  return (
    <>
      <circle className={state === 'lit' ? 'lamp-lit' : 'lamp-glass'} cx="22" cy="22" r="10" />
      {state === 'lit' && <path d={rays} />}
      {state === 'dim' && <path className="lamp-half" d="M12 22a10 10 0 0 0 20 0z" />}
      {state === 'dark' && <path d="M15 29L29 15" />}
    </>
  )
}

/** A tester lamp or a test bulb as it looks: lit, dim, dark, or not looked at (dashed). Words stand beside it. */
export function TesterLamp({ state }: { state: LampState | undefined }) {
  return (
    <svg className="tester-lamp" viewBox="0 0 44 44" aria-hidden="true" focusable="false">
      <LampShape state={state} />
    </svg>
  )
}
