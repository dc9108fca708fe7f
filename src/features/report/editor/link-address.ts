import { linkHrefSchema } from '#shared/report/schema/text-kit.ts';

/** What somebody typed as the place a link leads to. */
export type LinkAddress =
  { readonly ok: true; readonly href: string } | { readonly ok: false; readonly sentence: string };

const MAIL = /^[^\s@/:]+@[^\s@/]+\.[^\s@/]+$/u;
const HOST = /^[\p{L}\d-]+(\.[\p{L}\d-]+)+([/?#]\S*)?$/u;

/**
 * The web, mail, or a place here. A place of this server is kept with its whole address, so that it also leads
 * somewhere from the PDF.
 *
 * @param typed - as typed: `https://…`, `mail@…`, `/team/…`, `#4`
 * @param origin - of this server, `https://holdwater.example`
 */
export function linkAddress(typed: string, origin: string): LinkAddress {
  const href = completed(typed.trim(), origin);
  if (linkHrefSchema.safeParse(href).success) return { ok: true, href };
  return {
    ok: false,
    sentence:
      'A link leads to the web (https://…), to mail (name@…), or to a place here (/team/… or #4). Write one of these.',
  };
}

function completed(typed: string, origin: string): string {
  if (/^\/(?!\/)/u.test(typed)) return `${origin}${typed}`;
  if (MAIL.test(typed)) return `mailto:${typed}`;
  if (HOST.test(typed)) return `https://${typed}`;
  return typed;
}
