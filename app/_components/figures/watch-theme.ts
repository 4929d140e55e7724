const media = ['(prefers-color-scheme: dark)', 'print'];

/** Calls back when the colours of the page may have changed: the system's theme, the page's, or paper. */
export function watchTheme(changed: () => void): () => void {
  const queries = media.map((query) => window.matchMedia(query));
  for (const query of queries) query.addEventListener('change', changed);
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
  return () => {
    for (const query of queries) query.removeEventListener('change', changed);
    observer.disconnect();
  };
}
