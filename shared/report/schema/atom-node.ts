import { Node } from '@tiptap/core';
import { z } from 'zod';

/** What one of the report's own atoms is: an inline or block node that holds references and no text of its own. */
export interface AtomDefinition<Shape extends z.ZodRawShape> {
  readonly name: string;
  readonly inline: boolean;
  /** One schema per attribute; a document with any other value is refused. */
  readonly attributes: z.ZodObject<Shape>;
  /** Attributes of a node that was made without them; null where a node needs one given. */
  readonly fallback: Readonly<{ [Key in keyof z.infer<z.ZodObject<Shape>>]: unknown }>;
  /** The node in plain words, for text that leaves the program through the clipboard. */
  readonly text: (attrs: z.infer<z.ZodObject<Shape>>) => string;
}

/**
 * Builds the schema-only extension of an atom: attributes with their checks, and its way through the clipboard (one
 * element whose `data-attrs` carries the attributes as JSON). Node views are added by whoever draws it.
 *
 * @param definition - name, place and attributes
 * @returns an extension without any drawing
 */
export function atomNode<Shape extends z.ZodRawShape>(definition: AtomDefinition<Shape>): Node {
  const { name, inline, attributes, fallback } = definition;
  const tag = inline ? 'span' : 'div';
  return Node.create({
    name,
    group: inline ? 'inline' : 'block',
    inline,
    atom: true,
    selectable: true,
    draggable: true,
    addAttributes: () =>
      Object.fromEntries(
        Object.entries<unknown>(fallback).map(([key, value]) => [
          key,
          {
            default: value,
            rendered: false,
            parseHTML: () => null,
            validate: (given: unknown) => assertAttribute(name, key, attributes.shape[key], given),
          },
        ]),
      ),
    parseHTML: () => [
      { tag: `${tag}[data-report="${name}"]`, getAttrs: (element) => readAttributes(attributes, element) },
    ],
    renderHTML: ({ node }) => [
      tag,
      { 'data-report': name, 'data-attrs': JSON.stringify(node.attrs) },
      definition.text(node.attrs as z.infer<z.ZodObject<Shape>>),
    ],
    renderText: ({ node }) => definition.text(node.attrs as z.infer<z.ZodObject<Shape>>),
  });
}

function assertAttribute(node: string, key: string, schema: unknown, value: unknown): void {
  if (!(schema instanceof z.ZodType)) throw new TypeError(`${node}: has no attribute ${key}`);
  const parsed = schema.safeParse(value);
  if (!parsed.success) {
    throw new RangeError(
      `${node}: attribute ${key} is not valid: ${parsed.error.issues[0]?.message ?? 'unknown'}`,
    );
  }
}

function readAttributes(schema: z.ZodType, element: unknown): Record<string, unknown> | false {
  const text = (element as { getAttribute(name: string): string | null }).getAttribute('data-attrs');
  if (text === null) return false;
  try {
    const parsed = schema.safeParse(JSON.parse(text));
    return parsed.success ? (parsed.data as Record<string, unknown>) : false;
  } catch {
    return false;
  }
}
