(function () {
  try {
    const stored = localStorage.getItem('fairweight.theme');
    if (stored === 'light' || stored === 'dark') document.documentElement.dataset.theme = stored;
  } catch {
    // Storage can be switched off; the system's preference then decides.
  }
})();
