// Sets the colour scheme before the first paint. A file of its own, so that the page's
// Content-Security-Policy can forbid inline scripts.
(function () {
  var stored = null;
  try {
    stored = localStorage.getItem('furrowlight-scheme');
  } catch {
    stored = null;
  }
  var scheme = stored === 'light' || stored === 'dark' ? stored : 'auto';
  var dark =
    scheme === 'dark' ||
    (scheme === 'auto' && window.matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.setAttribute('data-mantine-color-scheme', dark ? 'dark' : 'light');
})();
