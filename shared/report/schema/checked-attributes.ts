import type { Attribute } from '@tiptap/core';
import type { z } from 'zod';

/**
 * Adds checks to the attributes of a ready-made node or mark.
 *
 * @param name - the node's name, for the message
 * @param attributes - the attributes as the ready-made extension has them
 * @param schemas - what each may hold; attributes without a schema are dropped
 * @returns the attributes that have a schema, each with its check
 */
export function checkedAttributes(
  name: string,
  attributes: Record<string, Attribute | undefined>,
  schemas: Readonly<Record<string, z.ZodType>>,
): Record<string, Attribute> {
  return Object.fromEntries(
    Object.entries(schemas).map(([key, schema]) => [
      key,
      {
        ...attributes[key],
        validate: (value: unknown) => {
          if (!schema.safeParse(value).success)
            throw new RangeError(`${name}: attribute ${key} is not valid`);
        },
      },
    ]),
  );
}
