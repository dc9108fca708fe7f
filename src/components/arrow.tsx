/** From what was to what is. */
export function Arrow() {
  return (
    <>
      <svg
        width="14"
        height="10"
        viewBox="0 0 14 10"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.4"
        aria-hidden="true"
        className="flex-none"
      >
        <path d="M1 5h11M9 1.8 12.2 5 9 8.2" />
      </svg>
      <span className="sr-only">now</span>
    </>
  );
}
