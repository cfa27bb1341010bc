// Sets the remembered theme before the first paint. Without one, the system's own holds.
(function () {
  try {
    var theme = localStorage.getItem('vw.theme');
    if (theme === 'light' || theme === 'dark') document.documentElement.dataset.theme = theme;
  } catch {
    // Storage may be refused (private windows); the system's theme holds then.
  }
})();
