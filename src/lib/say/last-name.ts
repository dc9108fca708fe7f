/** "Farrow" of "Ines Farrow": people are told by name, never by initials. */
export function lastName(name: string): string {
  return name.trim().split(/\s+/).at(-1) ?? name;
}

export function firstName(name: string): string {
  return name.trim().split(/\s+/)[0] ?? name;
}
