/** A brace as tall as what stands beside it; its point looks to the left. Drawing only. */
export function Brace() {
  const line = { fill: 'none', stroke: 'currentColor', strokeWidth: 1.25, strokeLinecap: 'round' } as const;
  return (
    <span aria-hidden="true" className="flex w-3 flex-none flex-col self-stretch text-ink-3">
      <svg width="12" height="7" className="flex-none">
        <path d="M11 .7C7 .7 6.4 3 6.4 6.5V7" {...line} />
      </svg>
      <i className="ml-[5.775px] flex-1 border-l-[1.25px]" />
      <svg width="12" height="12" className="flex-none">
        <path d="M6.4 0C6.4 4 5 6 1 6C5 6 6.4 8 6.4 12" {...line} />
      </svg>
      <i className="ml-[5.775px] flex-1 border-l-[1.25px]" />
      <svg width="12" height="7" className="flex-none">
        <path d="M6.4 0V.5C6.4 4 7 6.3 11 6.3" {...line} />
      </svg>
    </span>
  );
}
