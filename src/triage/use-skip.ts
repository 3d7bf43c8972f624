import { useNavigate } from 'react-router-dom'
import { useToast } from '../ui/toast.tsx'
import type { Triage } from './triage-state.ts'
import { useTriage } from './triage-store.tsx'

/** Leaves a step out: its answers are put back to `cleared`, with a way back, and the next step opens. */
export function useSkip() {
  const { triage, change } = useTriage()
  const navigate = useNavigate()
  const say = useToast()
  return (answered: boolean, cleared: Partial<Triage>, to: string): void => {
    const keys = Object.keys(cleared) as (keyof Triage)[]
    const before = Object.fromEntries(keys.map((key) => [key, triage[key]]))
    const leave = async () => {
      if (answered) {
        await change((from) => ({ ...from, ...cleared }))
        say({
          text: 'Step left out',
          action: { word: 'Undo', onPress: () => void change((from) => ({ ...from, ...before })) },
        })
      }
      await navigate(to)
    }
    void leave()
  }
}
