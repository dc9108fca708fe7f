declare global {
  /** Where libraries that add style elements look for the nonce that the page's policy asks of them. */
  var __webpack_nonce__: string | undefined;
}

/** The nonce that the server gave this page, or null where there is none (while developing). */
export function styleNonce(): string | null {
  const nonce = document.querySelector<HTMLMetaElement>('meta[name="style-nonce"]')?.content ?? '';
  return /^[A-Za-z0-9+/]+=*$/.test(nonce) ? nonce : null;
}

/** Gives it to the libraries that ask for it, so that a dialog may stop the page behind it from scrolling. */
export function adoptStyleNonce(): void {
  globalThis.__webpack_nonce__ = styleNonce() ?? undefined;
}
