/** Which problem's report a co-editing document is: `team/<slug>/problem/<number>`. */
export interface DocumentPlace {
  readonly team: string;
  readonly number: number;
}

const NAME = /^team\/([a-z0-9-]{1,80})\/problem\/([1-9]\d{0,2})$/;

/** Null for any other name. */
export function parseDocumentName(name: string): DocumentPlace | null {
  const [, team, number] = NAME.exec(name) ?? [];
  return team === undefined || number === undefined ? null : { team, number: Number(number) };
}
