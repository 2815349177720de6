// Runs before the first paint, so that a chosen theme never flashes the other one. The choice is written by src/lib/theme.ts.
try {
  const chosen = localStorage.getItem('spandrel.theme');
  if (chosen === 'light' || chosen === 'dark') document.documentElement.dataset.theme = chosen;
} catch {
  // Storage may be forbidden; the system's theme is used then.
}
