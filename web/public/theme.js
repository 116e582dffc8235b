// Before the first paint: the theme that was chosen here, where one was. Without a choice the system's own holds.
try {
  const theme = localStorage.getItem('steelyard.theme');
  if (theme === 'light' || theme === 'dark') document.documentElement.dataset.theme = theme;
} catch {
  // Storage is shut off: the system's theme holds.
}
