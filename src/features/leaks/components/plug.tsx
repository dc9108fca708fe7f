/** A mended hole. */
export function Plug() {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 20 18"
      className="absolute top-[13px] z-[2] -left-[9px] h-[18px] w-5 overflow-visible"
    >
      <path
        d="M.5 4 19 1.500V16.500L.5 14z"
        className="fill-paper stroke-ink"
        strokeWidth="1.6"
        strokeLinejoin="round"
      />
    </svg>
  );
}
