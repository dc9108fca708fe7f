const TUBES =
  'M4 3v20a2 2 0 0 0 2 2h2.6a2 2 0 0 0 2-2v-6.7h6.8V23a2 2 0 0 0 2 2H22a2 2 0 0 0 2-2V3M10.6 3v9.2h6.8V3';
const WATER =
  'M4 8.6V23a2 2 0 0 0 2 2h2.6a2 2 0 0 0 2-2v-6.7h6.8V23a2 2 0 0 0 2 2H22a2 2 0 0 0 2-2V8.6h-6.6v3.6h-6.8V8.6z';

/** An H made of two joined tubes at one level; without its water below 24 px. */
export function Mark({ size }: { readonly size: number }) {
  const isSmall = size < 24;
  return (
    <svg width={size} height={size} viewBox="0 0 28 28" aria-hidden="true" className="flex-none">
      {!isSmall && (
        <>
          <path d={WATER} fill="var(--color-water-fill)" />
          <path d="M4 8.6h6.6M17.4 8.6H24" stroke="var(--color-water)" strokeWidth="1.4" />
        </>
      )}
      <path
        d={TUBES}
        fill="none"
        stroke="currentColor"
        strokeWidth={isSmall ? 2.2 : 1.6}
        strokeLinecap="round"
        strokeLinejoin="round"
      />
    </svg>
  );
}
