/** What lets style elements of our own into the page; the server writes it into each answer. Nothing where no policy holds. */
export const styleNonce = document.querySelector<HTMLMetaElement>('meta[property=csp-nonce]')?.nonce;

/**
 * Some of antd's helpers (the lock of scrolling below a dialog, the measuring of scroll bars) write style elements without the
 * nonce that antd was given. Elements that our scripts make carry it; what comes into the page as markup still does not.
 */
export function giveStylesTheNonce(): void {
  if (!styleNonce) return;
  const make = document.createElement.bind(document);
  document.createElement = (name: string, options?: ElementCreationOptions): HTMLElement => {
    const element = make(name, options);
    if (element instanceof HTMLStyleElement) element.nonce = styleNonce;
    return element;
  };
}
