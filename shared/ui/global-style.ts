/** What only a style sheet can say: focus, the dialog's backdrop, motion and the device's own colours. */
const rules = `
:where(:focus-visible) { outline: 2px solid var(--focus); outline-offset: 2px; }
:where([data-focus="inside"]:focus-visible) { outline-offset: -2px; }
dialog::backdrop { background: var(--scrim); opacity: 0.4; }
* { scrollbar-color: var(--rule) transparent; }
[data-hides-from-sight]:not(:focus) { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); white-space: nowrap; }
@media (prefers-reduced-motion: reduce) {
  *:not([data-motion="fade"]), ::before, ::after, ::backdrop { animation-duration: 0s !important; transition-duration: 0s !important; scroll-behavior: auto !important; }
}
@media (forced-colors: active) {
  :where(:focus-visible) { outline-color: Highlight; }
  [aria-selected="true"], [aria-checked="true"], [aria-pressed="true"], [aria-current]:not([aria-current="false"]) { outline: 1px solid Highlight; }
}
`;

let isAdopted = false;

/** Adds the rules to the document, once. NOTE a constructed sheet passes the strictest content policy; a style element does not. */
export function adoptGlobalStyle(): void {
  if (isAdopted || typeof document === 'undefined') return;
  const sheet = new CSSStyleSheet();
  sheet.replaceSync(rules);
  document.adoptedStyleSheets = [...document.adoptedStyleSheets, sheet];
  isAdopted = true;
}
