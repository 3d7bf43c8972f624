// Runs before the first paint, so that a chosen theme never flashes the other. Kept apart because the page's
// policy allows no inline script. The choice is written by src/offline/theme-choice.ts.
;(function () {
  try {
    const theme = localStorage.getItem('tracelamp-theme')
    if (theme === 'light' || theme === 'dark') document.documentElement.dataset.theme = theme
  } catch {
    // A browser that keeps nothing follows the system.
  }
})()
