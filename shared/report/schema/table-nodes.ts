import type { Attribute, Node } from '@tiptap/core';
import { Table, TableCell, TableHeader, TableRow } from '@tiptap/extension-table';
import { z } from 'zod';
import { checkedAttributes } from './checked-attributes.ts';

const CELL = {
  colspan: z.number().int().min(1).max(50),
  rowspan: z.number().int().min(1).max(500),
  colwidth: z.array(z.number().int().min(0).max(4000)).nullable(),
  align: z.enum(['left', 'right', 'center']).nullable(),
};

/**
 * A table of text that is typed, not bound. Its cells hold a line of text each (`inline*`), so that an empty cell is
 * allowed and cannot be deleted for everybody by a merge.
 */
export const TableNodes: readonly Node[] = [
  Table.configure({ resizable: false }),
  TableRow,
  lineOfText(TableCell),
  lineOfText(TableHeader),
];

function lineOfText(cell: Node): Node {
  return cell.extend({
    content: 'inline*',
    addAttributes() {
      return checkedAttributes(cell.name, (this.parent?.() ?? {}) as Record<string, Attribute>, CELL);
    },
    addKeyboardShortcuts() {
      return {
        ...this.parent?.(),
        // Without this Enter in an empty cell would split its row in two.
        Enter: ({ editor }) => editor.isActive(cell.name) && editor.commands.setHardBreak(),
      };
    },
  });
}
