// Sets the colour scheme before the first paint. A file of its own, so that the page's
// Content-Security-Policy can forbid inline scripts.
(function (page) {
  function stored() {
    try {
      return page.localStorage.getItem('furrowlight-scheme');
    } catch {
      return null;
    }
  }
  var scheme = stored();
  var dark =
    scheme === 'dark' ||
    (scheme !== 'light' && page.matchMedia('(prefers-color-scheme: dark)').matches);
  page.document.documentElement.setAttribute('data-mantine-color-scheme', dark ? 'dark' : 'light');
})(globalThis);
