/* global document, localStorage */
// Runs before the first paint, as a file of its own because the Content-Security-Policy allows no script in the page.
// The choice is 'light' or 'dark'; without one the device decides.
try {
  var choice = localStorage.getItem('ferrule-theme');
  if (choice === 'light' || choice === 'dark') document.documentElement.dataset.theme = choice;
} catch {
  // Storage is closed in some private windows; the device's theme then holds.
}
