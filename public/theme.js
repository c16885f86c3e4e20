// Runs before the first paint, so that a page chosen dark never flashes light. src/lib/theme.ts stores the choice.
;(function () {
  try {
    var chosen = localStorage.getItem('underfoot-theme')
    if (chosen === 'light' || chosen === 'dark') document.documentElement.dataset.theme = chosen
  } catch {
    // Storage may be closed to us: the page then follows the system.
  }
})()
