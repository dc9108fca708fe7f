/** "Range" of "range on the tray": what stands over a narrow field or column. */
export function shortName(name: string): string {
  const first = name.split(' ')[0] ?? name;
  return `${first.charAt(0).toUpperCase()}${first.slice(1)}`;
}
