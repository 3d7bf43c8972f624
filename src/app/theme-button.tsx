import { useState } from 'react'
import { chooseTheme, themeChoice } from '../offline/theme-choice.ts'
import type { Theme } from '../offline/theme-choice.ts'
import { Icon } from '../ui/icon.tsx'

const following: Record<Theme, Theme> = { system: 'light', light: 'dark', dark: 'system' }

/** Goes round: as the system has it, light, dark. */
export function ThemeButton() {
  const [theme, setTheme] = useState(themeChoice)
  const turn = () => {
    const next = following[theme]
    chooseTheme(next)
    setTheme(next)
  }
  return (
    <button type="button" className="word-btn mast-theme" onClick={turn}>
      <Icon name="theme" />
      Theme: {theme}
    </button>
  )
}
