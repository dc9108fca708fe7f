/** The line dips below the current station: one count in words, standing on five pixels of water. */
export function Cup({ words }: { readonly words: string }) {
  return (
    <span className="absolute -bottom-6 left-1/2 h-[25px] min-w-full -translate-x-1/2 overflow-hidden rounded-b-[10px] border border-t-0 border-rule bg-[linear-gradient(to_top,var(--color-water-fill)_0_5px,var(--color-paper)_5px)] px-3.5 text-center text-2xs/[17px] font-medium whitespace-nowrap text-ink-2">
      {words}
    </span>
  );
}
