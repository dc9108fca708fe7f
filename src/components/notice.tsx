import type { ReactNode } from 'react';
import { classNames } from '#src/lib/class-names.ts';
import { Triangle } from './triangle.tsx';

interface NoticeProps {
  /** What happened, in one bold sentence. */
  readonly title: ReactNode;
  /** What to try. */
  readonly children?: ReactNode;
  readonly className?: string;
}

/** An error, in its place next to what failed. */
export function Notice({ title, children, className }: NoticeProps) {
  return (
    <div
      role="alert"
      className={classNames(
        'flex items-start gap-2.5 rounded-md border-[1.25px] border-leak bg-leak-wash px-3.5 py-2.5 text-sm',
        className,
      )}
    >
      <Triangle className="mt-0.5 flex-none text-leak" />
      <div className="min-w-0">
        <b>{title}</b>
        {children !== undefined && <div>{children}</div>}
      </div>
    </div>
  );
}
