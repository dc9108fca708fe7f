import { Mark, Node, type AnyExtension, type Attribute } from '@tiptap/core';
import StarterKit from '@tiptap/starter-kit';
import { z } from 'zod';
import { checkedAttributes } from './checked-attributes.ts';

/** Where a link may lead: the web, mail, or a place in this report. */
export const linkHrefSchema = z
  .string()
  .max(2000)
  .regex(/^(https?:\/\/|mailto:|#)\S+$/i);

const HEADING = { level: z.union([z.literal(2), z.literal(3)]) };
const ORDERED_LIST = {
  start: z.number().int().min(1).max(9999),
  type: z.enum(['1', 'a', 'A', 'i', 'I']).nullable(),
};
const LINK = { href: linkHrefSchema };

type Attributes = Record<string, Attribute | undefined>;

/** Paragraphs, headings, lists, line breaks, bold, italic and links: ready-made, with every attribute checked. */
export const TextKit = StarterKit.extend({
  addExtensions() {
    return (this.parent?.() ?? []).map(strict);
  },
}).configure({
  document: false,
  undoRedo: false,
  trailingNode: false,
  blockquote: false,
  code: false,
  codeBlock: false,
  horizontalRule: false,
  strike: false,
  underline: false,
  heading: { levels: [2, 3] },
  link: {
    openOnClick: false,
    defaultProtocol: 'https',
    isAllowedUri: (uri) => linkHrefSchema.safeParse(uri).success,
  },
});

/**
 * A list item may be empty, as a section may: one that had to begin with a paragraph would vanish with its nested
 * text when somebody deletes that paragraph while somebody else writes below it.
 */
function strict(extension: AnyExtension): AnyExtension {
  if (extension instanceof Node) {
    if (extension.name === 'listItem') return extension.extend({ content: 'block*' });
    if (extension.name === 'heading') return withChecks(extension, HEADING, { level: { default: 2 } });
    if (extension.name === 'orderedList') return withChecks(extension, ORDERED_LIST, {});
  }
  if (extension instanceof Mark && extension.name === 'link') {
    return extension.extend({
      addAttributes() {
        return checkedAttributes('link', (this.parent?.() ?? {}) as Attributes, LINK);
      },
    });
  }
  return extension;
}

function withChecks(node: Node, schemas: Readonly<Record<string, z.ZodType>>, change: Attributes): Node {
  return node.extend({
    addAttributes() {
      const given = (this.parent?.() ?? {}) as Attributes;
      const merged = Object.fromEntries(
        Object.entries(given).map(([key, attribute]) => [key, { ...attribute, ...change[key] }]),
      );
      return checkedAttributes(node.name, merged, schemas);
    },
  });
}
