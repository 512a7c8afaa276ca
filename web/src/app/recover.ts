const MARK = 'furrowlight-reloaded-at';
const PATIENCE_MS = 30_000;

/**
 * A tab that was open during an update asks for files that are gone. Load the new version, once: a
 * file that is missing for another reason must not send the page round in circles.
 */
export function reloadWhenOutdated(): void {
  window.addEventListener('vite:preloadError', (event) => {
    const last = Number(sessionStorage.getItem(MARK) ?? 0);
    if (Date.now() - last < PATIENCE_MS) return;
    sessionStorage.setItem(MARK, String(Date.now()));
    event.preventDefault();
    window.location.reload();
  });
}
