import type { ReactNode, TdHTMLAttributes, ThHTMLAttributes } from 'react';
import { classNames } from '#src/lib/class-names.ts';

interface TableProps {
  /** What the table holds, for screen readers unless it is to be seen. */
  readonly caption: string;
  readonly isCaptionSeen?: boolean;
  readonly head: ReactNode;
  readonly children: ReactNode;
  readonly className?: string;
}

/** Close-set rows under one ink line; a wide table scrolls in its own frame. */
export function Table({ caption, isCaptionSeen = false, head, children, className }: TableProps) {
  return (
    <div className={classNames('relative overflow-x-auto', className)}>
      <table className="w-full border-collapse text-sm">
        <caption className={isCaptionSeen ? 'pb-1 text-left text-xs text-ink-2' : 'sr-only'}>
          {caption}
        </caption>
        <thead>
          <tr>{head}</tr>
        </thead>
        <tbody>{children}</tbody>
      </table>
    </div>
  );
}

type Align = 'left' | 'right';

export function HeadCell({
  align = 'left',
  className,
  ...rest
}: Omit<ThHTMLAttributes<HTMLTableCellElement>, 'align'> & { readonly align?: Align }) {
  return (
    <th
      scope="col"
      {...rest}
      className={classNames(
        'border-b-[1.25px] border-ink px-2.5 py-1.5 align-bottom text-xs font-[550] text-ink-2',
        align === 'right' ? 'text-right' : 'text-left',
        className,
      )}
    />
  );
}

export function Cell({
  align = 'left',
  className,
  ...rest
}: Omit<TdHTMLAttributes<HTMLTableCellElement>, 'align'> & { readonly align?: Align }) {
  return (
    <td
      {...rest}
      className={classNames(
        'border-b border-hair px-2.5 py-[5px] align-middle',
        align === 'right' && 'text-right',
        className,
      )}
    />
  );
}
