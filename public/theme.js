// Marks the chosen theme before the first paint; a file of its own because the page's policy allows no inline script.
try {
  const choice = localStorage.getItem('layerwell-theme');
  if (choice === 'light' || choice === 'dark') document.documentElement.dataset.theme = choice;
} catch {
  // Storage closed to the page: the reader's system decides.
}
