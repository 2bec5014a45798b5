/** Where a reader's own choice of theme is kept; nothing is kept while the device's setting is followed. */
export const THEME_KEY = 'wattcairn-theme';

/**
 * Runs inline before the first paint, so that a page kept in the cache for everybody never flashes in the wrong theme.
 * The content policy names this text by its hash: it must reach the page unchanged.
 */
export const THEME_SCRIPT = `try{const t=localStorage.getItem('${THEME_KEY}');if(t==='light'||t==='dark')document.documentElement.dataset.theme=t}catch{}`;
