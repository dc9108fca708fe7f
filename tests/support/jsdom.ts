/** What jsdom lacks and the screens need: observers that never fire, and media queries that never match. */
class SilentObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}
Object.assign(globalThis, {
  ResizeObserver: SilentObserver,
  IntersectionObserver: SilentObserver,
  matchMedia: (media: string) => ({
    media,
    matches: false,
    addEventListener() {},
    removeEventListener() {},
  }),
});
