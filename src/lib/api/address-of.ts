/** Puts parameters into an endpoint's path: `/api/teams/:team` and `{ team: 'tern-rock' }`. */
export function addressOf(path: string, params: Readonly<Record<string, string | number>> = {}): string {
  return path.replace(/:([A-Za-z]+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined) throw new TypeError(`addressOf: ${path} needs "${name}"`);
    return encodeURIComponent(String(value));
  });
}
